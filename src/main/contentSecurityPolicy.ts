/** What the page may load and run: its own files only. Sent as a header and repeated in the page's own meta tag. */

/**
 * Inline styles are allowed because the plotting library writes its style rules and the SVG it exports that way;
 * inline scripts and evaluation are not.
 */
export const CONTENT_SECURITY_POLICY = [
  "default-src 'none'",
  "script-src 'self'",
  "worker-src 'self'",
  "connect-src 'self'",
  "style-src 'self' 'unsafe-inline'",
  "img-src 'self' data: blob:",
  "font-src 'self' data:",
  "object-src 'none'",
  "base-uri 'none'",
  "form-action 'none'",
  "frame-src 'none'",
].join('; ');

/** Framing can be forbidden only by a header: browsers ignore it in a meta tag. */
export const POLICY_HEADER = `${CONTENT_SECURITY_POLICY}; frame-ancestors 'none'`;
