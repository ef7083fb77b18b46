const swc = (syntax) => [
  '@swc/jest',
  {
    jsc: {
      target: 'es2022',
      parser: { syntax, decorators: true },
      transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
      keepClassNames: true,
    },
    module: { type: 'commonjs' },
  },
];

// Packages that ship only ES modules; jest runs in CommonJS mode, so they are transformed.
const esmOnly = [
  '@nestjs',
  '@tailrace',
  'file-type',
  'load-esm',
  'csv-parse',
  'uint8array-extras',
  'strtok3',
  'token-types',
  '@tokenizer',
  '@borewit',
  'd3-array',
  'd3-scale',
  'd3-shape',
  'd3-path',
  'd3-interpolate',
  'd3-color',
  'd3-format',
  'd3-time',
  'd3-time-format',
  'internmap',
];

export default {
  testEnvironment: 'node',
  testMatch: ['<rootDir>/src/**/*.spec.ts', '<rootDir>/test/**/*.e2e-spec.ts'],
  moduleNameMapper: { '^(\\.{1,2}/.*)\\.js$': ['$1.js', '$1'] },
  transform: { '^.+\\.ts$': swc('typescript'), '^.+\\.m?js$': swc('ecmascript') },
  transformIgnorePatterns: [`/node_modules/(?!(${esmOnly.join('|')})/)`],
  testTimeout: 60_000,
  maxWorkers: 2,
};
