import helmet from 'helmet';

/** Headers for every answer: nothing from elsewhere, no inline script or style, no framing. */
export const securityHeaders = helmet({
  contentSecurityPolicy: {
    useDefaults: false,
    directives: {
      defaultSrc: ["'self'"],
      scriptSrc: ["'self'"],
      styleSrc: ["'self'"],
      fontSrc: ["'self'"],
      imgSrc: ["'self'", 'data:'],
      connectSrc: ["'self'"],
      workerSrc: ["'self'", 'blob:'],
      objectSrc: ["'none'"],
      baseUri: ["'none'"],
      formAction: ["'self'"],
      frameAncestors: ["'none'"],
    },
  },
  // Only a server behind HTTPS may promise HTTPS; that is for whoever puts one in front.
  strictTransportSecurity: false,
  referrerPolicy: { policy: 'same-origin' },
  xFrameOptions: { action: 'deny' },
});
