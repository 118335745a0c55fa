import localFont from 'next/font/local';

/* The three faces are shipped with the application; nothing is fetched when it runs. */

const besley = localFont({
  src: '../node_modules/@fontsource-variable/besley/files/besley-latin-wght-normal.woff2',
  variable: '--font-besley',
  weight: '400 900',
  display: 'swap',
});

const publicSans = localFont({
  src: '../node_modules/@fontsource-variable/public-sans/files/public-sans-latin-wght-normal.woff2',
  variable: '--font-public-sans',
  weight: '100 900',
  display: 'swap',
});

const sometype = localFont({
  src: '../node_modules/@fontsource-variable/sometype-mono/files/sometype-mono-latin-wght-normal.woff2',
  variable: '--font-sometype',
  weight: '400 700',
  display: 'swap',
});

/** Class names that define --font-besley, --font-public-sans and --font-sometype. */
export const fontVariables = `${besley.variable} ${publicSans.variable} ${sometype.variable}`;
