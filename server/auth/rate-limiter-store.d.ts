// The package types this class at its root but exports it only from its own file.
declare module 'rate-limiter-flexible/lib/RateLimiterStoreAbstract.js' {
  export { RateLimiterStoreAbstract as default } from 'rate-limiter-flexible';
}
