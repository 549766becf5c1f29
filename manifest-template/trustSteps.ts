import type { Certificate } from './certificate.ts';

/** How a person makes a system trust the local server's certificate, and how to undo it: text for the terminal. */
export function trustSteps({ file, thumbprint, validTo }: Certificate, address: string): string {
  return `The certificate is ${file}
valid until ${validTo.toISOString().slice(0, 10)}, SHA-1 thumbprint ${thumbprint}.
A host loads Tautline only when the system trusts it.

Windows, in a command prompt of your own account (no administrator needed):
  trust   certutil -user -addstore Root "${file}"
  remove  certutil -user -delstore Root ${thumbprint}
Mac, in a terminal:
  trust   security add-trusted-cert -r trustRoot -k ~/Library/Keychains/login.keychain-db "${file}"
  remove  security delete-certificate -Z ${thumbprint} -t ~/Library/Keychains/login.keychain-db
On the web (the spreadsheet in a browser): a browser that uses the system's list needs no more than the above.
  Otherwise open ${address}/taskpane.html in a tab once and accept the certificate there;
  to take it back, remove the exception in the browser's certificate settings.
When you are done with it for good, remove it as above and delete the folder that holds it.`;
}
