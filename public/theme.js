// Sets the theme before the first paint; a file of its own because the page forbids scripts inside it.
(function () {
  var chosen = null;
  try {
    chosen = localStorage.getItem('spragyard-theme');
  } catch (error) {
    // A browser that keeps nothing follows the system.
  }
  var dark = chosen ? chosen === 'dark' : matchMedia('(prefers-color-scheme: dark)').matches;
  document.documentElement.dataset.theme = dark ? 'dark' : 'light';
})();
