import "server-only";

/** Request header in which the proxy tells a page its own address, path and query. Whatever came from outside under this name is overwritten. */
export const addressHeader = "x-ebbmark-address";
