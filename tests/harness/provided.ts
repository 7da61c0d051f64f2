/** What the set-ups of the test projects hand to their tests. */
declare module 'vitest' {
  interface ProvidedContext {
    /** Base address of the running server. */
    serverUrl: string;
    /** The database of that server. */
    databaseUrl: string;
    /** Where the mail of that server lies; `readerOf` of mailbox.ts reads it. */
    mailboxFolder: string;
    /** Connection to the throw-away cluster, as its superuser. */
    adminUrl: string;
    /** The migrated and seeded database that tests copy. */
    template: string;
  }
}

export {};
