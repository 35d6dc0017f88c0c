import localFont from 'next/font/local'

/** Archivo with its width axis, and its extended Latin for names; Commit Mono for numbers. All served by this app. */
export const archivo = localFont({
  src: '../node_modules/@fontsource-variable/archivo/files/archivo-latin-wdth-normal.woff2',
  variable: '--font-archivo',
  weight: '100 900',
  declarations: [{ prop: 'font-stretch', value: '62% 125%' }],
  display: 'swap',
})

export const archivoExtended = localFont({
  src: '../node_modules/@fontsource-variable/archivo/files/archivo-latin-ext-wdth-normal.woff2',
  variable: '--font-archivo-ext',
  weight: '100 900',
  declarations: [{ prop: 'font-stretch', value: '62% 125%' }],
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
})

export const commitMono = localFont({
  src: [
    { path: '../node_modules/@fontsource/commit-mono/files/commit-mono-latin-400-normal.woff2', weight: '400' },
    { path: '../node_modules/@fontsource/commit-mono/files/commit-mono-latin-700-normal.woff2', weight: '700' },
  ],
  variable: '--font-commit',
  display: 'swap',
  adjustFontFallback: false,
})
