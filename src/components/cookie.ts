/** Keeps a choice of appearance for a year, readable by the server when it draws the next page. Never for anything that decides access. */
export function keepInCookie(name: string, value: string): void {
  document.cookie = `${name}=${encodeURIComponent(value)}; path=/; max-age=31536000; samesite=lax`;
}
