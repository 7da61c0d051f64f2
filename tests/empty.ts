/** Stands in for modules that only mark a file as server code. */
export {};
