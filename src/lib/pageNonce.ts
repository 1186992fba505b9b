/** The token that the server told this page, by which its style elements pass the security policy; empty without one. */
export const pageNonce = document.querySelector<HTMLMetaElement>('meta[property="csp-nonce"]')?.nonce ?? "";

/** Lets dialogs and menus find the token too: they look for it under this name when they hold the page still. */
export function announcePageNonce(): void {
  Object.assign(globalThis, { __webpack_nonce__: pageNonce });
}
