// Who may import whom: an import that is not allowed here is refused by lint, so a new folder needs a line of its own.
import { posix, relative, sep } from 'node:path';

const DATA = ['package.json'];
const NODE = 'node:';
const ANY = 'any package';

/**
 * The first layer whose `of` a file's path starts with (or matches) holds for it. `may`: what it may import;
 * `types`: what it may import for types alone; `packages`: the packages it may import, NODE meaning Node's own.
 */
const layers = [
  { of: /^shared\/math\/(sun|moon|day|sky)\w*\.ts$/, may: ['shared/math/'], packages: ['astronomy-engine'] },
  { of: 'shared/math/', may: ['shared/math/'] },
  { of: 'shared/time/', may: ['shared/time/'], packages: ['luxon', '@photostructure/tz-lookup'] },
  { of: 'shared/text/', may: ['shared/text/'] },
  {
    of: 'shared/contract/',
    may: ['shared/contract/', 'shared/math/', 'shared/time/', 'shared/text/'],
    packages: ['zod'],
  },
  {
    of: 'shared/calculators/',
    may: ['shared/calculators/', 'shared/contract/', 'shared/math/', 'shared/time/', 'shared/text/'],
    packages: ['zod'],
  },

  { of: 'server/scripts/', may: ['server/', 'shared/', ...DATA], packages: [ANY, NODE] },
  { of: 'server/main.ts', may: ['server/(?!scripts/)', 'shared/', ...DATA], packages: [ANY, NODE] },
  {
    of: 'server/app.ts',
    may: ['server/(?!scripts/|main|config)', 'shared/'],
    types: ['server/config'],
    packages: [ANY, NODE],
  },
  { of: 'server/config.ts', may: ['shared/'], packages: ['zod', NODE] },
  {
    of: 'server/routes/',
    may: server('routes', 'middleware', 'http', 'policies', 'presenters', 'services'),
    types: ['server/config', 'server/models/'],
    packages: [ANY, NODE],
  },
  {
    of: 'server/middleware/',
    may: server('middleware', 'http', 'policies', 'presenters', 'services'),
    types: ['server/config', 'server/models/'],
    packages: [ANY, NODE],
  },
  {
    of: 'server/services/',
    may: server('services', 'models', 'migrations', 'mail', 'policies', 'presenters', 'http'),
    types: ['server/config'],
    packages: [ANY, NODE],
  },
  // Pure functions: what they judge or show is handed to them.
  {
    of: 'server/policies/',
    may: server('policies', 'presenters', 'http'),
    types: ['server/services/', 'server/models/'],
  },
  {
    of: 'server/presenters/',
    may: server('presenters', 'http'),
    types: ['server/services/', 'server/models/'],
    packages: ['zod'],
  },
  { of: 'server/models/', may: server('models'), packages: ['sequelize', NODE] },
  { of: 'server/migrations/', may: server('migrations') },
  {
    of: 'server/mail/',
    may: server('mail'),
    types: ['server/config', 'server/models/'],
    packages: [ANY, NODE],
  },
  // The committed documents are written from the routes themselves.
  {
    of: 'server/openapi/writeDocuments.ts',
    may: [...server('openapi', 'routes/api'), ...DATA],
    packages: ['openapi-typescript'],
  },
  {
    of: 'server/openapi/',
    may: [...server('openapi', 'presenters', 'http'), ...DATA],
    types: ['server/routes/'],
    packages: ['@asteasolutions/zod-to-openapi', 'zod'],
  },
  { of: 'server/http/', may: server('http'), packages: ['express', NODE] },

  { of: /^src\/(main\.ts|App\.vue)$/, may: ['src/', 'shared/'], packages: [ANY] },
  { of: 'src/router/', may: client('router', 'text', 'views', 'stores'), packages: ['vue', 'vue-router'] },
  {
    of: 'src/views/',
    may: client('views', 'text', 'form', 'components', 'composables', 'stores', 'router', 'styles', 'assets'),
    types: ['src/api/'],
    packages: [ANY],
  },
  {
    of: 'src/components/',
    may: client(
      'components',
      'text',
      'form',
      'composables',
      'stores',
      'router/navigation',
      'styles',
      'assets',
    ),
    types: ['src/api/'],
    packages: [ANY],
  },
  {
    of: 'src/composables/',
    may: client('composables', 'text', 'form', 'stores', 'api', 'styles'),
    packages: [ANY],
  },
  {
    of: 'src/stores/',
    may: client('stores', 'api', 'text', 'styles'),
    types: ['src/router/navigation'],
    packages: [ANY],
  },
  { of: 'src/api/', may: client('api'), types: ['openapi/'], packages: [ANY] },
  { of: 'src/styles/', may: client('styles'), packages: [ANY] },
  // The logic of forms and its words: functions without components.
  { of: 'src/form/', may: client('form', 'text') },
  { of: 'src/text/', may: client('text') },
  { of: 'src/assets/', may: client('assets') },
  { of: 'src/public/', may: [] },
  {
    of: 'src/widget/',
    may: client('widget', 'text', 'form', 'components', 'composables', 'api', 'styles', 'assets'),
    packages: [ANY],
  },
  { of: /^src\/[\w-]+\.d\.ts$/, may: [], packages: [ANY] },

  // The examples use what a stranger has: HTTP.
  { of: 'examples/', may: ['examples/'], packages: [NODE] },
];

function server(...folders) {
  return [...folders.map((name) => `server/${name}/`), 'shared/'];
}

function client(...folders) {
  return [...folders.map((name) => `src/${name}`), 'shared/'];
}

function layerOf(path) {
  if (!/^(shared|server|src|examples)\//.test(path)) return undefined;
  const layer = layers.find(({ of }) => (typeof of === 'string' ? path.startsWith(of) : of.test(path)));
  return layer ?? { of: path, isUnknown: true };
}

function reasonAgainst(path, source, isType) {
  const layer = layerOf(path);
  if (!layer) return undefined;
  if (layer.isUnknown) return 'This file has no place in the list of who may import whom';
  const { may = [], types = [], packages = [] } = layer;
  if (!source.startsWith('.')) {
    const isNode = source.startsWith(NODE);
    const name = /^(@[^/]+\/)?[^/]+/.exec(source)?.[0] ?? source;
    const isAllowed = isNode ? packages.includes(NODE) : packages.includes(ANY) || packages.includes(name);
    return isAllowed ? undefined : `${path} may not import the package ${isNode ? source : name}`;
  }
  const target = posix.join(posix.dirname(path), source.replace(/\?.*$/, ''));
  // An import of a folder means the index in it.
  const isMeant = (pattern) => new RegExp(`^${pattern}`).test(target) || `${target}/` === pattern;
  if (may.some(isMeant)) return undefined;
  if (types.some(isMeant)) return isType ? undefined : `${path} may import ${target} for its types alone`;
  return `${path} may not import ${target}`;
}

/** The ESLint rule over that list. */
export const importLayers = {
  meta: { type: 'problem', schema: [] },
  create(context) {
    const path = relative(context.cwd, context.filename).split(sep).join('/');
    const check = (node, source, isType) => {
      const reason =
        typeof source?.value === 'string' ? reasonAgainst(path, source.value, isType) : undefined;
      if (reason) context.report({ node, message: reason });
    };
    const areAllTypes = (specifiers) =>
      specifiers.length > 0 && specifiers.every((one) => one.importKind === 'type');
    return {
      ImportDeclaration: (node) =>
        check(node, node.source, node.importKind === 'type' || areAllTypes(node.specifiers)),
      ExportNamedDeclaration: (node) => check(node, node.source, node.exportKind === 'type'),
      ExportAllDeclaration: (node) => check(node, node.source, node.exportKind === 'type'),
      ImportExpression: (node) => check(node, node.source, false),
      TSImportType: (node) => check(node, node.source ?? node.argument?.literal, true),
    };
  },
};
