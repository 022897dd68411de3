const minute = 60_000;

/** Requests a minute from one address; someone who types fast makes about a hundred. */
export const generalThrottle = [{ ttl: minute, limit: 1200 }];

/** For routes that hash a password, which costs the server time and memory. */
export const passwordThrottle = { default: { ttl: minute, limit: 120 } };
