// The theme that the rider chose, if any: src/ui/theme-choice.ts writes it.
try {
  const theme = localStorage.getItem("sumpless-theme");
  if (theme) document.documentElement.dataset.theme = theme;
} catch {
  // No storage: the system's theme.
}
