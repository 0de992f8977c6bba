// Runs before the first paint, so that a remembered colour scheme shows without a flash. Kept apart from the page
// because the content security policy forbids inline scripts.
(() => {
  try {
    const scheme = localStorage.getItem('quietrail.scheme');
    if (scheme === 'light' || scheme === 'dark') document.documentElement.classList.add(scheme);
  } catch {
    // Storage may be forbidden; then the system's scheme holds.
  }
})();
