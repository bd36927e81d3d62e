/** The part of autocannon that the bench uses; the package ships no types. */
declare module 'autocannon' {
  interface Options {
    url: string;
    connections: number;
    /** Seconds. */
    duration: number;
    headers?: Record<string, string>;
  }
  interface Result {
    requests: { average: number };
    non2xx: number;
  }
  export default function autocannon(options: Options): Promise<Result>;
}
