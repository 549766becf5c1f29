/** Tests are TypeScript, transformed by swc; a plain closing line comes from our reporter. */
export default {
  testMatch: ['<rootDir>/test/**/*.test.ts'],
  testEnvironment: 'node',
  transform: {
    '^.+\\.tsx?$': ['@swc/jest', { jsc: { parser: { syntax: 'typescript', tsx: false }, target: 'es2022' } }],
  },
  reporters: ['default', '<rootDir>/test/closingLine.mjs'],
  modulePathIgnorePatterns: ['<rootDir>/dist', '<rootDir>/package/'],
};
