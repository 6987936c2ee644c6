import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import { Button } from "./button";

describe("Button", () => {
  it("does its work when pressed", async () => {
    const work = vi.fn();
    render(<Button onClick={work}>Compute in full</Button>);
    await userEvent.click(screen.getByRole("button", { name: "Compute in full" }));
    expect(work).toHaveBeenCalledOnce();
  });

  it("says what it waits for, does nothing, and can still be reached with the keyboard", async () => {
    const work = vi.fn();
    render(
      <Button onClick={work} waitsFor="Full computation waits for line 5.04.">
        Compute in full
      </Button>,
    );
    const button = screen.getByRole("button", { name: "Compute in full", description: "Full computation waits for line 5.04." });
    expect(button).toHaveAttribute("aria-disabled", "true");
    await userEvent.tab();
    expect(button).toHaveFocus();
    await userEvent.keyboard("{Enter}");
    await userEvent.click(button);
    expect(work).not.toHaveBeenCalled();
  });

  it("submits no form while it waits", async () => {
    const submit = vi.fn((event: Event) => event.preventDefault());
    const { container } = render(
      <form>
        <Button type="submit" busy>
          Sign
        </Button>
      </form>,
    );
    container.querySelector("form")?.addEventListener("submit", submit);
    await userEvent.click(screen.getByRole("button", { name: "Sign" }));
    expect(submit).not.toHaveBeenCalled();
  });
});
