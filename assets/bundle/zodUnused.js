// Stands in for the parts of zod that only a server needs (metro.config.js): JSON Schema in both directions and
// the compiler, a third of the library's size. The client only parses; calling one of these is a mistake.
function absent() {
  throw new Error('This part of zod is left out of the web bundle, see assets/bundle/zodUnused.js.');
}

const later = () => absent;

export const INVALID = Symbol.for('zod.compile.invalid');
export class ZodCompileAsyncError extends Error {}
export class ZodCompileUnsupportedError extends Error {}
export class JSONSchemaGenerator {
  constructor() {
    absent();
  }
}
export {
  absent as compile, absent as compileFn, absent as withParser,
  absent as toJSONSchema, absent as aggregateChecks, absent as fromJSONSchema,
  later as createToJSONSchemaMethod, later as createStandardJSONSchemaMethod,
};
