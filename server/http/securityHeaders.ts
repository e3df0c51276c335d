import { IncomingMessage, ServerResponse } from 'node:http';
import { Socket } from 'node:net';
import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * The policy under which the client runs: nothing from elsewhere, no inline script, no inline style. The one hash is
 * that of the empty string: react-native-web appends an empty style element and fills it by insertRule, which the
 * policy lets through once the element itself is allowed.
 */
const POLICY = {
  defaultSrc: ["'none'"],
  scriptSrc: ["'self'"],
  styleSrc: ["'self'", "'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='"],
  imgSrc: ["'self'", 'data:'],
  fontSrc: ["'self'"],
  connectSrc: ["'self'"],
  manifestSrc: ["'self'"],
  workerSrc: ["'self'"],
  baseUri: ["'none'"],
  formAction: ["'self'"],
  frameAncestors: ["'none'"],
  objectSrc: ["'none'"],
};

/**
 * The headers of every answer. None depends on the request, so helmet makes them once and not at each key press.
 * @param options.behindTls people reach the server by https (set by its public address): only then may a browser be
 *   told to insist on it
 */
export function securityHeaders({ behindTls }: { behindTls: boolean }): RequestHandler {
  const shield = helmet({
    contentSecurityPolicy: { useDefaults: false, directives: POLICY },
    crossOriginEmbedderPolicy: false,
    strictTransportSecurity: behindTls ? { maxAge: 365 * 24 * 3600, includeSubDomains: false } : false,
    xFrameOptions: { action: 'deny' },
  });
  const headers: [string, string][] = [['Permissions-Policy', 'camera=(), geolocation=(), microphone=(), payment=(), usb=()']];
  let whole = false;
  const recorder = new ServerResponse(new IncomingMessage(new Socket()));
  shield(recorder.req, recorder, (fault?: unknown) => { whole = fault === undefined; });
  if (!whole) throw new Error('The security headers could not be made.');
  for (const [name, value] of Object.entries(recorder.getHeaders())) headers.push([name, String(value)]);
  return (_request, response, next) => {
    response.removeHeader('X-Powered-By'); // Express names itself unless told not to
    for (const [name, value] of headers) response.setHeader(name, value);
    next();
  };
}
