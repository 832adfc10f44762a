/** How the program is built and packed: three targets of Vite, and what goes into a package for each system. */
import { createRequire } from 'node:module'
import { svelte } from '@sveltejs/vite-plugin-svelte'
import type { Configuration } from 'electron-builder'
import { readFileSync } from 'node:fs'
import { basename } from 'node:path'
import type { InlineConfig, Plugin } from 'vite'
import { FILES as FACES } from './app/print/faces.ts'
import { licences } from './app/start/licences.ts'

const root = import.meta.dirname
const shared = { configFile: false, logLevel: 'warn' } satisfies InlineConfig

/** The typefaces of the calc sheet, beside the bundle that reads them (app/print/faces.ts). */
const faces: Plugin = {
  name: 'faces',
  generateBundle() {
    const { resolve } = createRequire(import.meta.url)
    for (const file of Object.values(FACES))
      this.emitFile({ type: 'asset', fileName: basename(file), source: readFileSync(resolve(file)) })
  },
}

/**
 * The Node side: the Electron shell, the loopback page and the desk's worker, which finds its file by the name `worker.js` beside
 * it. Everything is inside but Electron, Node's own modules and the one package with a binary.
 */
const main: InlineConfig = {
  ...shared,
  root,
  plugins: [faces, licences],
  ssr: { noExternal: true, external: ['better-sqlite3', 'electron'] },
  build: {
    ssr: true,
    outDir: 'out/main',
    target: 'node24',
    minify: true,
    rolldownOptions: {
      input: { main: 'app/main.ts', page: 'app/page/main.ts', worker: 'app/desk/worker.ts' },
      output: { entryFileNames: '[name].js', chunkFileNames: '[name].js' },
    },
  },
}

/** The bridge into the window: one file, CommonJS, as a sandboxed preload has to be; it requires Electron and nothing else. */
const preload: InlineConfig = {
  ...shared,
  root,
  ssr: { noExternal: true, external: ['electron'] },
  build: {
    ssr: true,
    outDir: 'out/preload',
    target: 'node24',
    rolldownOptions: {
      input: { preload: 'app/preload.ts' },
      output: { format: 'cjs', entryFileNames: '[name].cjs', codeSplitting: false },
    },
  },
}

/**
 * The window, the same for Electron's own protocol and for the loopback page. The content security policy has no room for
 * inline scripts or data addresses in scripts and styles.
 */
export const rendererOf = (folder: string, outDir: string): InlineConfig => ({
  ...shared,
  root: folder,
  base: './',
  plugins: [svelte({ configFile: false, compilerOptions: { runes: true } }), licences],
  worker: { format: 'es' },
  build: { outDir, emptyOutDir: true, assetsInlineLimit: 0, modulePreload: { polyfill: false } },
})

export const targets: readonly InlineConfig[] = [main, preload, rendererOf(`${root}/renderer`, `${root}/out/renderer`)]

/** For electron-builder. The binaries of every system stay in: a package for one system may be made on another. */
export const packaging: Configuration = {
  appId: 'net.longtravel.app',
  productName: 'Longtravel',
  directories: { output: 'out/packages', buildResources: 'resources/icons' },
  files: [
    'out/main/**',
    'out/preload/**',
    'out/renderer/**',
    'package.json',
    'resources/licences/**',
    '!**/*.map',
    '!node_modules/better-sqlite3/{deps,src}/**',
    '!node_modules/better-sqlite3/binding.gyp',
    '!node_modules/better-sqlite3/prebuilds/*musl*',
    '!node_modules/node-addon-api/**',
  ],
  asarUnpack: ['node_modules/better-sqlite3/prebuilds/**'],
  npmRebuild: false,
  publish: null,
  // The program inside can only be what was packed: no other script, no option from outside, no right over files.
  electronFuses: {
    runAsNode: false,
    enableNodeOptionsEnvironmentVariable: false,
    enableNodeCliInspectArguments: false,
    onlyLoadAppFromAsar: true,
    grantFileProtocolExtraPrivileges: false,
  },
  linux: { target: ['AppImage', 'deb'], category: 'Engineering', icon: 'resources/icons/longtravel.png' },
  win: { target: ['nsis'], icon: 'resources/icons/longtravel.png' },
  mac: { target: ['dmg'], category: 'public.app-category.developer-tools', icon: 'resources/icons/longtravel.png' },
}
