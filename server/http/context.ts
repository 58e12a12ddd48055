import { createContext } from 'react-router';

/** The nonce that this answer's inline scripts carry (Content-Security-Policy). */
export const nonceContext = createContext<string>();

/** What is known of one request before any route runs. `pattern` is filled in once a route matched. */
export interface RequestFacts {
  id: string;
  /** The asker's address, taken from the proxies that TRUST_PROXY names. */
  ip: string;
  pattern: string | null;
}

export const requestContext = createContext<RequestFacts>();
