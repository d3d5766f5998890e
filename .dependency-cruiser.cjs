/** The arrows of the tree in DEVELOPERS.md. Nothing points back. */
module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      comment: 'Two modules that need each other are one idea, or hide a third.',
      from: {},
      to: { circular: true },
    },
    {
      name: 'shared-is-pure',
      severity: 'error',
      comment: 'shared/ runs in the browser, the server and the command line: no Node, no src/, no server/.',
      from: { path: '^shared/' },
      to: { path: '^(src|server|scripts|tests)/' },
    },
    {
      name: 'shared-has-no-io',
      severity: 'error',
      comment: 'No I/O inside shared/.',
      from: { path: '^shared/' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'rhythm-knows-no-samples',
      severity: 'error',
      comment: 'Patient and pacemaker are discrete events.',
      from: { path: '^shared/engine/rhythm/' },
      to: { path: '^shared/engine/(heart|disturbance|recorder|reading)/' },
    },
    {
      name: 'recorder-knows-numbers-only',
      severity: 'error',
      comment: 'The recorder knows channels and a rate, not hearts or pacemakers.',
      from: { path: '^shared/engine/recorder/' },
      to: { path: '^shared/(engine/(rhythm|heart|disturbance|reading)|gallery|paper)/' },
    },
    {
      name: 'heart-knows-no-rhythm',
      severity: 'error',
      comment: 'The heart turns activation into vectors; who started it is not its business.',
      from: { path: '^shared/engine/heart/' },
      to: { path: '^shared/engine/(rhythm|disturbance|recorder|reading)/' },
    },
    {
      name: 'engine-knows-no-paper',
      severity: 'error',
      comment: 'The engine makes numbers; paper, formats and gallery use them.',
      from: { path: '^shared/engine/' },
      to: { path: '^shared/(paper|formats|gallery)/' },
    },
    {
      name: 'scripts-and-tests-are-leaves',
      severity: 'error',
      comment: 'Nothing imports tests/ or scripts/.',
      from: { path: '^(shared|server|src)/' },
      to: { path: '^(tests|scripts)/' },
    },
    {
      name: 'kebab-case',
      severity: 'error',
      comment: 'File names are kebab-case.',
      from: {},
      to: { path: '^(shared|scripts|tests)/.*[A-Z].*\\.ts$' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { extensions: ['.ts', '.tsx', '.js', '.json'] },
  },
};
