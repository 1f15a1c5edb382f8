import { Router } from 'express';
import swaggerUi from 'swagger-ui-express';

/** The page of the API's documentation, all of it from this server; it reads /api/v1/openapi.json. */
export const openapiPage = (): Router => {
  const options = {
    customSiteTitle: 'Rowcall API',
    swaggerUrl: '/api/v1/openapi.json',
    swaggerOptions: { defaultModelsExpandDepth: 0, displayRequestDuration: true },
  };
  return Router().use(swaggerUi.serve, swaggerUi.setup(undefined, options));
};
