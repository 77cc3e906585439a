/** Follows links as a browser does, without its pages: keeps cookies by host and port, goes where it is sent. */
export class BrowserJar {
  private static made = 0;
  /** Each browser has an address of its own (RFC 5737): sign-ins are limited by address. */
  private readonly address = `198.51.100.${++BrowserJar.made}`;
  private readonly cookies = new Map<string, Map<string, string>>();

  cookiesOf(url: string): Map<string, string> {
    const { host } = new URL(url);
    const known = this.cookies.get(host) ?? new Map<string, string>();
    this.cookies.set(host, known);
    return known;
  }

  /** One request; a redirect is returned, not followed. */
  async fetch(url: string, init: RequestInit = {}): Promise<Response> {
    const jar = this.cookiesOf(url);
    const { pathname } = new URL(url);
    const cookie = [...jar]
      .filter(([key]) => pathname.startsWith(key.split(" ")[1] ?? "/"))
      .map(([key, value]) => `${key.split(" ")[0]}=${value}`)
      .join("; ");
    const headers = {
      ...(init.headers as Record<string, string> | undefined),
      "x-forwarded-for": this.address,
      ...(cookie && { cookie }),
    };
    const answer = await fetch(url, { ...init, headers, redirect: "manual" });
    for (const line of answer.headers.getSetCookie()) {
      const [pair = ""] = line.split(";");
      const path = /; path=([^;]+)/i.exec(line)?.[1] ?? "/";
      // Under its name alone where it is for the whole site, else under name and path.
      const name = pair.slice(0, pair.indexOf("=")) + (path === "/" ? "" : ` ${path}`);
      const value = pair.slice(pair.indexOf("=") + 1);
      if (value === "" || /expires=Thu, 01 Jan 1970/i.test(line)) jar.delete(name);
      else jar.set(name, value);
    }
    return answer;
  }

  /** Follows redirects until `stop` says so of where it would go next, or a page comes. */
  async follow(url: string, stop: (next: string) => boolean = () => false, init: RequestInit = {}) {
    let at = url;
    let answer = await this.fetch(at, init);
    for (let hops = 0; answer.status >= 300 && answer.status < 400 && hops < 12; hops += 1) {
      at = new URL(answer.headers.get("location") ?? "", at).href;
      if (stop(at)) return { url: at, answer };
      answer = await this.fetch(at);
    }
    return { url: at, answer };
  }
}
