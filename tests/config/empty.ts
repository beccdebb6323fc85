/** Stands in for marker modules, such as `server-only`, outside Next. */
export {};
