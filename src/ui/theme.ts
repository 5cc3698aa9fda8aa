export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

const KEPT_AS = 'stillpoint.theme';

/** The theme chosen in this browser; `system` when none was, or the browser keeps nothing. */
export function chosenTheme(): Theme {
  try {
    const kept = localStorage.getItem(KEPT_AS);
    return THEMES.find((theme) => theme === kept) ?? 'system';
  } catch {
    return 'system';
  }
}

/** Shows the page in this theme and keeps the choice. */
export function chooseTheme(theme: Theme): void {
  showTheme(theme);
  try {
    if (theme === 'system') localStorage.removeItem(KEPT_AS);
    else localStorage.setItem(KEPT_AS, theme);
  } catch {
    // The browser keeps nothing for us; the choice then lasts as long as the page.
  }
}

export function showTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
}
