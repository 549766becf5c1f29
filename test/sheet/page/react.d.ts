/** The one function of react that the page uses; its own types are not installed. */
declare module 'react' {
  export function createElement(type: string, properties: Readonly<Record<string, unknown>>): object;
}
