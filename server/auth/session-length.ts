const HOUR_MS = 60 * 60 * 1000;

/** A staff session ends this long after the last page. */
export const STAFF_IDLE_MS = 12 * HOUR_MS;

/** A customer's session ends this long after the sign-in. */
export const CUSTOMER_MS = 30 * 24 * HOUR_MS;
