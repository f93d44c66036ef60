import { resolve } from 'node:path';
import { cruise, type ICruiseOptions, type ICruiseResult, type IForbiddenRuleType } from 'dependency-cruiser';

/** Each layer may import those before it. `src/index.ts` stands above all: it only names what the engine offers. */
export const layers = [
  'quantity',
  'numerics',
  'physics',
  'manifest',
  'study',
  'verdict',
  'evidence',
  'dossier',
  'chart',
  'render',
  'publish',
  'cli',
] as const;

/** Layers that calculate and word: they get bytes and give data, and touch neither disk, network, process nor clock. */
const pureLayers = layers.slice(0, layers.indexOf('chart'));
const effects = 'fs|fs/promises|child_process|worker_threads|net|http|https|http2|dns|dgram|os|process|readline|timers';

const below = (names: readonly string[]) => `^src/(${names.join('|')})/`;

const rules: IForbiddenRuleType[] = [
  ...layers.slice(0, -1).map((layer, i) => ({
    name: `${layer} imports only the layers before it`,
    severity: 'error' as const,
    from: { path: below([layer]) },
    to: { path: below(layers.slice(i + 1)) },
  })),
  {
    name: 'no layer imports the list of what the engine offers',
    severity: 'error',
    from: { path: '^src/.+/' },
    to: { path: '^src/[^/]+$' },
  },
  {
    name: 'physics and what it stands on import nothing of the machine',
    severity: 'error',
    from: { path: below(['quantity', 'numerics', 'physics']) },
    to: { dependencyTypes: ['core'] },
  },
  {
    name: 'calculating layers have no effects',
    severity: 'error',
    from: { path: below(pureLayers) },
    to: { dependencyTypes: ['core'], path: `^(node:)?(${effects})$` },
  },
  {
    name: 'the program needs no development package',
    severity: 'error',
    from: { path: '^src/' },
    to: { dependencyTypes: ['npm-dev', 'npm-no-pkg', 'npm-unknown'], dependencyTypesNot: ['type-only'] },
  },
  { name: 'every import is found', severity: 'error', from: { path: '^src/' }, to: { couldNotResolve: true } },
  { name: 'no cycles', severity: 'error', from: { path: '^src/' }, to: { circular: true } },
];

export interface LayerReport {
  readonly modules: number;
  readonly dependencies: number;
  /** One line per violation, sorted. */
  readonly violations: readonly string[];
}

/** As Node resolves an import of an ES module. */
const resolving = {
  extensions: ['.ts', '.js'],
  exportsFields: ['exports'],
  conditionNames: ['node', 'import', 'default'],
};

/** Checks the layers of the tree at `base`, which holds `src/`. Types count: an import of a type is an import. */
export async function checkLayers(base: string): Promise<LayerReport> {
  const options: ICruiseOptions = {
    baseDir: resolve(base),
    ruleSet: { forbidden: rules },
    validate: true,
    tsPreCompilationDeps: true,
    combinedDependencies: true,
    doNotFollow: { path: 'node_modules' },
  };
  const { output } = await cruise(['src'], options, resolving);
  if (typeof output === 'string') throw new Error('the cruise gave text instead of a result');
  return {
    modules: ownModules(output).length,
    dependencies: countDependencies(output),
    violations: listViolations(output),
  };
}

const ownModules = (result: ICruiseResult) => result.modules.filter((module) => module.source.startsWith('src/'));

const countDependencies = (result: ICruiseResult) =>
  ownModules(result).reduce((sum, module) => sum + module.dependencies.length, 0);

function listViolations(result: ICruiseResult): string[] {
  const found = result.summary.violations.map(({ rule, from, to, cycle }) => {
    const way = cycle ? [from, ...cycle.map((step) => step.name)].join(' → ') : `${from} → ${to}`;
    return `${rule.name}: ${way}`;
  });
  const strangers = ownModules(result)
    .map((module) => module.source)
    .filter((path) => path.split('/').length > 2 && !layers.some((layer) => path.startsWith(`src/${layer}/`)))
    .map((path) => `every module belongs to a layer: ${path}`);
  return [...found, ...strangers].sort();
}
