/** Tests are TypeScript, transformed by swc; a plain closing line comes from our reporter. */
export default {
  testMatch: ['<rootDir>/test/**/*.test.ts'],
  testEnvironment: 'node',
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
