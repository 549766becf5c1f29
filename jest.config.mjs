/** Tests are TypeScript, transformed by swc; a plain closing line comes from our reporter. */
export default {
  testMatch: ['<rootDir>/test/**/*.test.ts'],
  testEnvironment: 'node',
  // Generous: nothing is decided by the clock, and a busy machine is no fault.
  testTimeout: 60_000,
  // The browser tests wait more than they work: two at a time on two cores.
  maxWorkers: 2,
  transform: {
    '^.+\\.ts$': ['@swc/jest', { jsc: { parser: { syntax: 'typescript' }, target: 'es2022' } }],
    '^.+\\.tsx$': [
      '@swc/jest',
      {
        jsc: {
          parser: { syntax: 'typescript', tsx: true },
          target: 'es2022',
          transform: { react: { runtime: 'automatic', importSource: 'preact' } },
        },
      },
    ],
  },
  reporters: ['default', '<rootDir>/test/closingLine.mjs'],
  modulePathIgnorePatterns: ['<rootDir>/dist', '<rootDir>/package/'],
};
