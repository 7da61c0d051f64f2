// The package ships no types; this is what the bench uses of it.
declare module 'autocannon' {
  interface Options {
    readonly url: string;
    readonly connections: number;
    readonly duration: number;
    readonly method: 'GET' | 'POST';
    readonly headers: Readonly<Record<string, string>>;
    readonly body: string;
  }
  interface Result {
    readonly requests: { readonly average: number };
    readonly latency: { readonly p50: number; readonly p99: number; readonly max: number };
    readonly errors: number;
    readonly non2xx: number;
  }
  export default function autocannon(options: Options): Promise<Result>;
}
