import { Router } from 'express';
import swaggerUi from 'swagger-ui-express';

/** Plain colours of our own over the reference's; the console's appearances live elsewhere. */
const STYLE = `
.swagger-ui .topbar { display: none }
body { background: #faf7f2 }
.swagger-ui, .swagger-ui .info .title { color: #2b2622; font-family: 'Fira Sans', system-ui, sans-serif }
.swagger-ui .opblock.opblock-post { background: #f3ece1; border-color: #9a5b13 }
.swagger-ui .opblock.opblock-post .opblock-summary-method { background: #8a4f0e }
.swagger-ui .opblock.opblock-get { background: #eaf0f0; border-color: #2f6b6b }
.swagger-ui .opblock.opblock-get .opblock-summary-method { background: #2a5f5f }
.swagger-ui .btn.authorize { color: #8a4f0e; border-color: #8a4f0e }
.swagger-ui .btn.authorize svg { fill: #8a4f0e }
.swagger-ui .btn.execute { background: #8a4f0e; border-color: #8a4f0e }
`;

/** The reference, made from the same document as /openapi.json; it can send calls with a key. */
export function docsRoutes(document: Record<string, unknown>): Router {
  const router = Router();
  const options = {
    customCss: STYLE,
    customSiteTitle: 'Evenfall API reference',
    swaggerOptions: { persistAuthorization: false, tryItOutEnabled: true, docExpansion: 'list' },
  };
  router.use(swaggerUi.serveFiles(document, options), swaggerUi.setup(document, options));
  return router;
}
