// A menu is a <details>, which works without this; with it, Escape and a press elsewhere close it, as people expect.
(() => {
  const open = () => document.querySelector("details.menu[open]");

  document.addEventListener("keydown", (event) => {
    const menu = open();
    if (event.key !== "Escape" || !menu) return;
    menu.open = false;
    menu.querySelector("summary").focus();
  });
  document.addEventListener("click", (event) => {
    const menu = open();
    if (menu && !menu.contains(event.target)) menu.open = false;
  });
  document.addEventListener("focusin", (event) => {
    const menu = open();
    if (menu && !menu.contains(event.target)) menu.open = false;
  });
})();
