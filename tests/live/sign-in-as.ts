import type { Product } from '@/tests/support/start-product';

/** A browser's cookie jar, as far as signing in needs one. */
export class Jar {
  readonly cookies = new Map<string, string>();

  get header(): string {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }

  take(response: Response): void {
    for (const line of response.headers.getSetCookie()) {
      const [pair = ''] = line.split(';');
      const at = pair.indexOf('=');
      this.cookies.set(pair.slice(0, at), pair.slice(at + 1));
    }
  }
}

/** Signs in as a page does: the token against forgery, then the three things typed. */
export async function signInAs(product: Pick<Product, 'url'>, typed: { email: string; password: string; code: string }): Promise<{ response: Response; jar: Jar }> {
  const jar = new Jar();
  const csrf = await fetch(`${product.url}/api/auth/csrf`);
  jar.take(csrf);
  const { csrfToken } = (await csrf.json()) as { csrfToken: string };
  const response = await fetch(`${product.url}/api/auth/callback/credentials`, {
    method: 'POST',
    redirect: 'manual',
    headers: { origin: product.url, 'content-type': 'application/x-www-form-urlencoded', cookie: jar.header },
    body: new URLSearchParams({ ...typed, csrfToken, callbackUrl: product.url, json: 'true' }),
  });
  jar.take(response);
  return { response, jar };
}

interface DemoPerson {
  readonly email: string;
  readonly password: string;
  readonly code: string;
}

/** Signs a demo person in with what the sign-in page of a demo offers. */
export async function signInAsDemo(product: Pick<Product, 'url'>, email: string): Promise<Jar> {
  const { people } = (await (await fetch(`${product.url}/api/demo-people`)).json()) as { people: DemoPerson[] };
  const person = people.find((one) => one.email === email);
  if (person === undefined) throw new Error(`There is no demo person ${email}.`);
  const { response, jar } = await signInAs(product, person);
  if (response.status !== 200) throw new Error(`Signing in answered ${response.status}: ${await response.text()}`);
  return jar;
}
