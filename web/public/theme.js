// Sets the theme before the first paint. A file of its own, because the content policy allows no inline script.
;(function () {
  var stored = null
  try {
    stored = localStorage.getItem('emberline.theme')
  } catch {
    // Storage may be forbidden; the system's choice then stands.
  }
  var night = stored === 'night' || (stored !== 'day' && matchMedia('(prefers-color-scheme: dark)').matches)
  document.documentElement.dataset.theme = night ? 'night' : 'day'
})()
