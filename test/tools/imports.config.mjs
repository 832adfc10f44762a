// Who may import whom (DEVELOPERS.md, "Rooms"): ground <- flow <- uses; inside the flow each room knows only those upstream.
const ground = 'quantity|formula|sources|catalogue'

/** Core rooms and the rooms each may import beside itself and the ground below it. */
const rooms = {
  quantity: '',
  sources: '',
  formula: 'quantity|sources',
  catalogue: 'quantity',
  job: ground,
  crane: `${ground}|job`,
  section: `${ground}|job`,
  travel: 'quantity|crane',
  basis: `${ground}|job|crane|section|travel`,
  review: `${ground}|job|crane|section|travel|basis`,
  figure: `${ground}|job|crane|section|travel|basis|review`,
  sheet: `${ground}|job|crane|section|travel|basis|review|figure`,
  search: `${ground}|job|crane|section|travel|basis|review`,
  evidence: `${ground}|job|crane|section|travel|basis|review`,
  contract: `${ground}|job|crane|section|travel|basis|review|figure|sheet|search|evidence`,
}

/** The prefix is empty for the project and the fixture's folder for the fixtures that prove the rule bites. */
const under = process.env.IMPORTS_UNDER ?? ''

export default {
  forbidden: [
    ...Object.entries(rooms).map(([room, may]) => ({
      name: `core-${room}`,
      comment: `core/${room} may import only itself${may ? ` and ${may.replaceAll('|', ', ')}` : ''}`,
      severity: 'error',
      from: { path: `^${under}core/${room}/` },
      to: { path: `^${under}core/`, pathNot: `^${under}core/(${may ? `${may}|` : ''}${room})/` },
    })),
    {
      name: 'core-is-pure',
      comment: 'core knows none of its doors',
      severity: 'error',
      from: { path: `^${under}core/` },
      to: { path: `^${under}(app|renderer)/` },
    },
    {
      name: 'core-no-node-builtins',
      comment: 'core runs in a page as well as on Node',
      severity: 'error',
      from: { path: `^${under}core/` },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'resources-by-catalogue-only',
      comment: 'only core/catalogue reads resources/*.json',
      severity: 'error',
      from: { path: `^${under}core/`, pathNot: `^${under}core/catalogue/` },
      to: { path: `^${under}resources/` },
    },
    {
      name: 'us-and-eu-apart',
      severity: 'error',
      from: { path: `^${under}core/basis/(us|eu)/` },
      to: { path: `^${under}core/basis/(us|eu)/`, pathNot: `^${under}core/basis/$1/` },
    },
    {
      name: 'doors-apart',
      comment: 'app and renderer meet only in core/contract',
      severity: 'error',
      from: { path: `^${under}(app|renderer)/` },
      to: { path: `^${under}(app|renderer)/`, pathNot: `^${under}$1/` },
    },
    {
      name: 'tests-are-leaves',
      severity: 'error',
      from: { path: `^${under}(app|core|renderer)/` },
      to: { path: `^${under}test/` },
    },
    { name: 'no-circle', severity: 'error', from: {}, to: { circular: true } },
    { name: 'resolvable', severity: 'error', from: {}, to: { couldNotResolve: true } },
  ],
  options: {
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
    exclude: under ? undefined : { path: '^test/fixtures/imports' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['svelte', 'browser', 'import', 'node', 'default', 'types'],
      extensions: ['.ts', '.svelte', '.mjs', '.js', '.json'],
    },
  },
}
