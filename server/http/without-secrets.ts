/**
 * Takes what could open something out of an address or a text that is going to be logged: the end of paths that carry
 * a token, values of token fields, and everything as long as our tokens (43 characters of base64url).
 */
export function withoutSecrets(text: string): string {
  return text
    .replace(/(\/(?:link|share|unsubscribe)\/)[^/?#\s"']+/g, "$1[token]")
    .replace(/([?&](?:token|csrfToken|password|code)=)[^&#\s]*/gi, "$1[hidden]")
    .replace(/[A-Za-z0-9_-]{43,}/g, "[token]");
}
