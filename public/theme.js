// Runs before the first paint, so that the page never flashes in the wrong theme. client/app/theme.ts keeps the key.
(function () {
  var kept = null;
  try {
    kept = localStorage.getItem('ribwright.theme');
  } catch {
    // A browser that forbids storage follows the system.
  }
  var night = kept === 'night' || (kept !== 'day' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.dataset.theme = night ? 'night' : 'day';
})();
