// Loaded in <head> without defer: the remembered choice must hold before the first paint.
(() => {
  const key = "clatterbench-theme";
  const root = document.documentElement;
  root.dataset.js = "";

  const remembered = () => {
    try {
      return localStorage.getItem(key);
    } catch {
      // Storage is refused in some private windows: the system's preference holds.
      return null;
    }
  };
  const show = (choice) => {
    if (choice === "light" || choice === "dark") root.dataset.theme = choice;
    else delete root.dataset.theme;
    for (const control of document.querySelectorAll("select[data-theme-choice]"))
      control.value = root.dataset.theme ?? "system";
  };

  show(remembered());
  document.addEventListener("DOMContentLoaded", () => show(remembered()));
  document.addEventListener("change", (event) => {
    const control = event.target;
    if (!(control instanceof HTMLSelectElement) || !control.matches("[data-theme-choice]")) return;
    show(control.value);
    try {
      if (control.value === "system") localStorage.removeItem(key);
      else localStorage.setItem(key, control.value);
    } catch {
      // The choice still holds for this page.
    }
  });
  window.addEventListener("storage", (event) => {
    if (event.key === key) show(event.newValue);
  });
})();
