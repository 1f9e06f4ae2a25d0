import type { Config } from '../../config'

/**
 * A page of ours as an address that works outside of it: below PUBLIC_URL, else where the server listens.
 * @param path with its slash, e.g. `/join`; may carry a query and a fragment
 */
export function linkTo(config: Pick<Config, 'publicUrl' | 'host' | 'port'>, path: string): string {
  const host = config.host === '0.0.0.0' || config.host === '::' ? 'localhost' : config.host
  const base = config.publicUrl ?? `http://${host.includes(':') ? `[${host}]` : host}:${config.port}`
  return new URL(path, base).href
}
