/** The error that the host's object model raises: a code, a sentence and where it happened. */
export class HostError extends Error {
  readonly code: string;
  readonly debugInfo: { readonly code: string; readonly message: string; readonly errorLocation: string };
  readonly traceMessages: string[] = [];
  readonly innerError = null;

  constructor(code: string, message: string, errorLocation = '') {
    super(message);
    this.name = 'RichApi.Error';
    this.code = code;
    this.debugInfo = { code, message, errorLocation };
  }
}

export function propertyNotLoaded(name: string): HostError {
  return new HostError(
    'PropertyNotLoaded',
    `The property '${name}' is not available. Before reading the property's value, call the load method on the containing object and call "context.sync()" on the associated request context.`,
    name,
  );
}

export function valueNotLoaded(): HostError {
  return new HostError(
    'ValueNotLoaded',
    'The value of the result object has not been loaded yet. Before reading the value property, call "context.sync()" on the associated request context.',
  );
}

export function invalidArgument(location: string): HostError {
  return new HostError(
    'InvalidArgument',
    'The argument is invalid or missing or has an incorrect format.',
    location,
  );
}

export function itemNotFound(location: string): HostError {
  return new HostError('ItemNotFound', "The requested resource doesn't exist.", location);
}

export function accessDenied(location: string): HostError {
  return new HostError('AccessDenied', 'You cannot perform the requested operation.', location);
}

/** A member of the host's object model that the stand-in lacks: visible at once, so that the gap can be closed. */
export function notImplemented(member: string): Error {
  return new Error(`not implemented in the stand-in: ${member}`);
}
