const root = import.meta.dirname;

// Swagger UI reads OpenAPI 3.1 through these packages, whose modules for the browser Turbopack puts in a wrong order; their
// CommonJS sources it handles.
const describing = ['openapi-3-1', 'openapi-3-2', 'json-schema-2020-12'].map(
  (name) => `@swagger-api/apidom-ns-${name}`,
);

/** @type {import('next').NextConfig} */
const config = {
  reactStrictMode: true,
  poweredByHeader: false,
  // Its badge would cover the page, also in browser tests.
  devIndicators: false,
  // Types are checked once, by `npm test`; a start need not wait for them again.
  typescript: { ignoreBuildErrors: true },
  // Loaded from node_modules as they are: their own files look for others beside them.
  serverExternalPackages: ['sequelize', 'piscina', 'pg'],
  outputFileTracingRoot: root,
  outputFileTracingIncludes: { '/*': ['./dist/**/*'] },
  turbopack: {
    root,
    resolveAlias: Object.fromEntries(describing.map((name) => [name, `./node_modules/${name}/src/index.cjs`])),
  },
  // `npm run dev` is opened by the address it prints.
  allowedDevOrigins: ['127.0.0.1'],
};

export default config;
