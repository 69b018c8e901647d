/*
 * Sets the theme before anything is painted: what the person chose, else what the system prefers. A plain script, not a module,
 * since it must run first. What is kept for the next time is kept in cookies of the page: they outlive a change of the port, which
 * is another one at every start.
 */
(() => {
  const YEAR = 31536000;
  const system = window.matchMedia('(prefers-color-scheme: dark)');
  const kept = (name) => document.cookie.split('; ').find((pair) => pair.startsWith(`modestead-${name}=`))?.split('=')[1] ?? '';
  let choice = ['light', 'dark'].includes(kept('theme')) ? kept('theme') : 'system';
  const apply = () => {
    const dark = choice === 'dark' || (choice === 'system' && system.matches);
    document.documentElement.dataset.theme = dark ? 'dark' : 'light';
    window.dispatchEvent(new Event('themechange'));
  };
  system.addEventListener('change', apply);
  window.modesteadPage = {
    /** @param {string} name @returns {string} what was kept under the name, '' when nothing */
    kept,
    /** @param {string} name letters only @param {string} value letters and digits only */
    keep(name, value) {
      document.cookie = `modestead-${name}=${value}; path=/; max-age=${YEAR}; SameSite=Strict`;
    },
    /** @returns {'system'|'light'|'dark'} */
    theme: () => choice,
    /** @param {'system'|'light'|'dark'} wanted */
    chooseTheme(wanted) {
      choice = wanted;
      window.modesteadPage.keep('theme', wanted);
      apply();
    },
  };
  apply();
})();
