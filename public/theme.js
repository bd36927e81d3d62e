// Runs before the first paint, outside the bundle: the content-security policy allows no inline script.
(function () {
  var theme = null;
  try {
    theme = localStorage.getItem('theme');
  } catch {
    // Storage can be refused; the system's preference then decides each time.
  }
  if (theme !== 'paper' && theme !== 'cellar')
    theme = matchMedia('(prefers-color-scheme: dark)').matches ? 'cellar' : 'paper';
  document.documentElement.dataset.theme = theme;

  // Contracts are checked without generated code, which the same policy refuses. They read this when they load.
  globalThis.__zod_globalConfig = { jitless: true };
})();
