import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it } from "vitest";
import { ThemeSwitch } from "../theme/theme-switch";
import { BadgeMenu } from "./badge-menu";

const menu = (
  <BadgeMenu badge="E-114" role="Engineer">
    <ThemeSwitch initial="system" />
    <button type="button">Sign out</button>
  </BadgeMenu>
);

describe("BadgeMenu", () => {
  it("opens and closes with the keyboard, and gives the focus back", async () => {
    render(menu);
    const badge = screen.getByRole("button", { name: "Engineer E-114" });
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
    await userEvent.tab();
    await userEvent.keyboard("{Enter}");
    expect(badge).toHaveAttribute("aria-expanded", "true");
    await userEvent.tab();
    await userEvent.keyboard("{Escape}");
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
    expect(badge).toHaveFocus();
  });

  it("puts the chosen sheet on the page and takes it off for the system's choice", async () => {
    render(menu);
    await userEvent.click(screen.getByRole("button", { name: "Engineer E-114" }));
    await userEvent.click(screen.getByRole("radio", { name: "Dark" }));
    expect(document.documentElement).toHaveAttribute("data-theme", "dark");
    expect(document.cookie).toContain("theme=dark");
    await userEvent.click(screen.getByRole("radio", { name: "As the system" }));
    expect(document.documentElement).not.toHaveAttribute("data-theme");
  });
});
