// Loaded before the first paint, so that a page never flashes in the wrong theme. src/lib/theme.ts changes the choice.
;(function () {
  var choice = null
  try {
    choice = localStorage.getItem('pintle.theme')
  } catch {
    // Storage can be closed off; the system's preference then decides.
  }
  var dark = choice === 'dark' || (choice !== 'light' && matchMedia('(prefers-color-scheme: dark)').matches)
  document.documentElement.dataset.theme = dark ? 'dark' : 'light'
})()
