import '@fontsource/source-sans-3/400.css'
import '@fontsource/source-sans-3/600.css'
import '@fontsource/source-sans-3/700.css'
import './app/styles.css'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { App } from './app/app'
import { followSystemTheme } from './lib/theme'

followSystemTheme()

const root = document.getElementById('root')
if (root === null) throw new Error('index.html has no #root.')
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
)
