import type { Settings } from '../settings.ts';

/**
 * Only our own scripts, styles, fonts and pictures. `blob:` pictures are previews of files a person has just chosen;
 * forms may lead to the payment service's hosted page.
 */
export function contentSecurityPolicy({ secureCookies }: Settings) {
  return {
    useDefaults: false,
    directives: {
      defaultSrc: ["'none'"],
      scriptSrc: ["'self'"],
      // Quasar positions its overlays through the style attribute of elements it makes.
      styleSrc: ["'self'"],
      styleSrcAttr: ["'unsafe-inline'"],
      imgSrc: ["'self'", 'data:', 'blob:'],
      fontSrc: ["'self'"],
      connectSrc: ["'self'"],
      manifestSrc: ["'self'"],
      mediaSrc: ["'self'", 'blob:'],
      formAction: ["'self'"],
      baseUri: ["'none'"],
      frameAncestors: ["'none'"],
      ...(secureCookies ? { upgradeInsecureRequests: [] } : {}),
    },
  };
}
