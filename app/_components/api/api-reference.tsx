'use client';

import 'swagger-ui-react/swagger-ui.css';
import './api-reference.css';
import dynamic from 'next/dynamic';

const SwaggerUI = dynamic(() => import('swagger-ui-react'), {
  ssr: false,
  loading: () => <p className="text quiet">Reading the description of the interface.</p>,
});

/** Every call of the REST interface, read off its OpenAPI document, to read and to try. */
export function ApiReference({ url }: { url: string }) {
  return (
    <div className="api-reference">
      <SwaggerUI
        url={url}
        docExpansion="list"
        defaultModelsExpandDepth={0}
        defaultModelExpandDepth={4}
        displayRequestDuration
        deepLinking
        supportedSubmitMethods={['get', 'post']}
      />
    </div>
  );
}
