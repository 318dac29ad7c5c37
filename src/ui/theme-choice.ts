/** The rider's theme, kept on this phone. public/theme.js applies it before the first paint. */
const KEY = "sumpless-theme";

export type ThemeChoice = "system" | "light" | "dark";

export function chosenTheme(): ThemeChoice {
  const { theme } = document.documentElement.dataset;
  return theme === "light" || theme === "dark" ? theme : "system";
}

export function chooseTheme(choice: ThemeChoice): void {
  const { dataset } = document.documentElement;
  if (choice === "system") delete dataset.theme;
  else dataset.theme = choice;
  try {
    if (choice === "system") localStorage.removeItem(KEY);
    else localStorage.setItem(KEY, choice);
  } catch {
    // Chosen for as long as this page is open.
  }
}
