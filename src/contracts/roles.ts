/** One role a person. The words are those shown; the order is that of the people page. */
export const roles = ["engineer", "approver", "auditor", "administrator"] as const;
export type Role = (typeof roles)[number];

export const roleWords: Record<Role, string> = {
  engineer: "Engineer",
  approver: "Approver",
  auditor: "Auditor",
  administrator: "Administrator",
};
