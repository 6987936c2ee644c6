import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, it, vi } from "vitest";
import { AckList } from "./ack-list";
import { Notice } from "./notice";

it("interrupts with an error and waits with a caution", () => {
  render(
    <>
      <Notice tone="error" title="Not kept since 14:36.">
        The connection is lost.
      </Notice>
      <Notice tone="caution">The fluid sheet was revised.</Notice>
    </>,
  );
  expect(screen.getByRole("alert")).toHaveTextContent("Not kept since 14:36. The connection is lost.");
  expect(screen.getByRole("status")).toHaveTextContent("The fluid sheet was revised.");
});

it("asks for each caution by its own box, named by its words", async () => {
  const toggle = vi.fn();
  render(
    <AckList
      label="Cautions you acknowledge"
      items={[
        { id: "C1", words: "This is a screening." },
        { id: "C2", words: "One gas temperature stands for the whole vessel." },
      ]}
      acknowledged={new Set(["C1"])}
      onToggle={toggle}
    />,
  );
  expect(screen.getByRole("checkbox", { name: "C1 This is a screening." })).toBeChecked();
  await userEvent.click(screen.getByText("One gas temperature stands for the whole vessel."));
  expect(toggle).toHaveBeenCalledExactlyOnceWith("C2", true);
});
