import { randomBytes } from 'node:crypto'
import type { RequestHandler } from 'express'

declare global {
  namespace Express {
    interface Locals {
      nonce: string
    }
  }
}

const permissions = ['geolocation', 'camera', 'microphone', 'screen-wake-lock']
  .map((name) => `${name}=(self)`)
  .join(', ')

type Settings = {
  /** Origin of the server as people see it. */
  publicUrl: string
  production: boolean
}

/**
 * Content-Security-Policy of one answer. Scripts and style sheets come from the server itself or carry the nonce;
 * style attributes are free, since drawings place things by them.
 */
export function contentSecurityPolicy(nonce: string, { production }: Settings): string {
  const directives: Record<string, string[]> = {
    'default-src': ["'self'"],
    'script-src': ["'self'", `'nonce-${nonce}'`],
    'style-src': ["'self'", `'nonce-${nonce}'`],
    'style-src-attr': ["'unsafe-inline'"],
    'img-src': ["'self'", 'blob:', 'data:'],
    'media-src': ["'self'", 'blob:'],
    'worker-src': ["'self'", 'blob:'],
    'connect-src': production ? ["'self'"] : ["'self'", 'ws:'],
    'font-src': ["'self'"],
    'object-src': ["'none'"],
    'base-uri': ["'none'"],
    'form-action': ["'self'"],
    'frame-ancestors': ["'none'"],
  }
  return Object.entries(directives)
    .map(([name, values]) => `${name} ${values.join(' ')}`)
    .join('; ')
}

/**
 * Sets the headers that protect every answer, and `res.locals.nonce`. `Referrer-Policy` stays `same-origin`: with
 * `no-referrer` browsers send `Origin: null` and every form is refused.
 */
export function securityHeaders(settings: Settings): RequestHandler {
  const overTls = settings.production && settings.publicUrl.startsWith('https:')
  return (_request, response, next) => {
    const nonce = randomBytes(16).toString('base64')
    response.locals.nonce = nonce
    response.set({
      'Content-Security-Policy': contentSecurityPolicy(nonce, settings),
      'Cross-Origin-Opener-Policy': 'same-origin',
      'Cross-Origin-Resource-Policy': 'same-origin',
      'Permissions-Policy': permissions,
      'Referrer-Policy': 'same-origin',
      'X-Content-Type-Options': 'nosniff',
    })
    if (overTls) response.set('Strict-Transport-Security', 'max-age=31536000; includeSubDomains')
    next()
  }
}
