/** The person's choice of sheet. Without one the system's preference decides, in CSS alone, so nothing flashes and no script is needed. */
export const themes = ["light", "dark", "system"] as const;
export type Theme = (typeof themes)[number];

export const themeCookie = "theme";

/** The choice kept in a cookie; anything else counts as no choice. */
export const readTheme = (cookie: string | undefined): Theme => themes.find((theme) => theme === cookie) ?? "system";

/** Value of `data-theme` on the root element: absent while the system decides. */
export const themeAttribute = (theme: Theme): "light" | "dark" | undefined => (theme === "system" ? undefined : theme);

/** Puts the choice on the page that is open, without drawing it anew. */
export function showTheme(theme: Theme): void {
  const attribute = themeAttribute(theme);
  if (attribute) document.documentElement.dataset.theme = attribute;
  else delete document.documentElement.dataset.theme;
}
