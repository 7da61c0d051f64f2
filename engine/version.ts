/** The version that every answer carries: it changes whenever an answer to the same question may change. */
export const engineVersion = '1.0.0';
