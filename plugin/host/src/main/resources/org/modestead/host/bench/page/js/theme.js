/* Sets the theme before anything is painted: what the person chose, else what the system prefers. A plain script, not a module. */
(() => {
  const key = 'modestead.theme';
  const system = window.matchMedia('(prefers-color-scheme: dark)');
  let choice = 'system';
  try {
    choice = window.localStorage.getItem(key) ?? choice;
  } catch {
    /* Without a store the system's preference holds. */
  }
  const apply = () => {
    const dark = choice === 'dark' || (choice !== 'light' && system.matches);
    document.documentElement.dataset.theme = dark ? 'dark' : 'light';
    window.dispatchEvent(new Event('themechange'));
  };
  system.addEventListener('change', apply);
  window.modesteadTheme = {
    /** Returns 'system', 'light' or 'dark'. */
    choice: () => choice,
    /** @param {'system'|'light'|'dark'} wanted */
    choose(wanted) {
      choice = wanted;
      try {
        window.localStorage.setItem(key, wanted);
      } catch {
        /* The choice holds for this page only. */
      }
      apply();
    },
  };
  apply();
})();
