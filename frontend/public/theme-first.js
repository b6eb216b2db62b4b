// Runs before the first paint so that a dark sheet never flashes white. A file of its own: the policy allows no inline script.
// theme-choice.ts keeps the same key and the same rule.
(function () {
  var choice = null;
  try {
    choice = window.localStorage.getItem('holdwater.theme');
  } catch {
    // Storage may be blocked; the device's own setting then decides.
  }
  if (choice !== 'light' && choice !== 'dark' && choice !== 'sun') {
    choice = window.matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light';
  }
  document.documentElement.setAttribute('data-theme', choice);
})();
