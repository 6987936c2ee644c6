import { pages } from "@/contracts/paths";
import type { Role } from "@/contracts/roles";

type Item = { label: string; href: string };

const desk = { label: "Desk", href: pages.desk };
const log = { label: "Log", href: pages.log };
const change = { label: "Change of state", href: pages.changeOfState };
const plant = [desk, { label: "Screenings", href: pages.screenings }, { label: "Sections", href: pages.sections }, change, log];

/** Words of the strip by role. What a role may not open is not offered. */
const menus: Record<Role, readonly Item[]> = {
  engineer: plant,
  approver: plant,
  auditor: [desk, change, log],
  administrator: [desk, { label: "People", href: pages.people }, { label: "Facilities", href: pages.facilities }, log],
};

/** The menu with the item in hand marked: the one whose address the page's address starts with. */
export const menuFor = (role: Role, pathname: string): (Item & { current: boolean })[] =>
  menus[role].map((item) => ({ ...item, current: pathname === item.href || pathname.startsWith(`${item.href}/`) }));
