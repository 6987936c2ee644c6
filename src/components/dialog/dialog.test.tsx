import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { beforeAll, describe, expect, it } from "vitest";
import { Button } from "../button/button";
import { Dialog } from "./dialog";

/** jsdom has no modal dialogs; this is the part of the standard that the component leans on: `open`, and focus on the first control. */
beforeAll(() => {
  HTMLDialogElement.prototype.showModal = function showModal() {
    this.setAttribute("open", "");
    this.querySelector<HTMLElement>("button, input")?.focus();
  };
  HTMLDialogElement.prototype.close = function close() {
    this.removeAttribute("open");
  };
});

function Withdraw() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Withdraw</Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title="Withdraw the record"
        actions={<Button onClick={() => setOpen(false)}>Keep it</Button>}
      >
        Nobody can rely on it afterwards.
      </Dialog>
    </>
  );
}

describe("Dialog", () => {
  it("is named by its title, takes the focus and gives it back", async () => {
    render(<Withdraw />);
    await userEvent.click(screen.getByRole("button", { name: "Withdraw" }));
    expect(screen.getByRole("dialog", { name: "Withdraw the record" })).toBeVisible();
    expect(screen.getByRole("button", { name: "Keep it" })).toHaveFocus();

    await userEvent.click(screen.getByRole("button", { name: "Keep it" }));
    expect(screen.queryByRole("dialog")).toBeNull();
    expect(screen.getByRole("button", { name: "Withdraw" })).toHaveFocus();
  });

  it("closes when the browser cancels it, as on Escape", async () => {
    render(<Withdraw />);
    await userEvent.click(screen.getByRole("button", { name: "Withdraw" }));
    screen.getByRole("dialog").dispatchEvent(new Event("cancel", { cancelable: true }));
    await expect.poll(() => screen.queryByRole("dialog")).toBeNull();
  });
});
