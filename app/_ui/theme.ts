/** The reader's choice of light or dark; `system` follows the device. Kept in a cookie, so that no page flashes. */
export const THEMES = ["system", "light", "dark"] as const;

export type Theme = (typeof THEMES)[number];

/** How the switch shows each: its name, and a picture in a square of 16. */
export const THEME_LOOKS: Readonly<Record<Theme, { readonly label: string; readonly icon: string }>> = {
  system: { label: "As the device", icon: "M2.5 3.5h11v7h-11zM5.5 13.5h5M8 10.5v3" },
  light: {
    label: "Light",
    icon: "M8 5a3 3 0 1 0 0 6 3 3 0 0 0 0-6ZM8 1.5v1.5M8 13v1.5M1.5 8H3M13 8h1.5M3.4 3.4l1.1 1.1M11.5 11.5l1.1 1.1M12.6 3.4l-1.1 1.1M4.5 11.5l-1.1 1.1",
  },
  dark: { label: "Dark", icon: "M13 9.6A5.5 5.5 0 0 1 6.4 3a5.5 5.5 0 1 0 6.6 6.6Z" },
};

export const THEME_COOKIE = "rhoform-theme";

/** The theme a cookie names; anything unknown follows the device. */
export function parseTheme(value: string | undefined): Theme {
  return THEMES.find((theme) => theme === value) ?? "system";
}

/** Shows a theme at once and remembers it for a year. Browser only. */
export function applyTheme(theme: Theme): void {
  if (theme === "system") delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
  document.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=31536000; samesite=lax`;
}
