/** The version that is written beside results; a test holds it equal to the package's. */
export const version = '1.0.0';
