/** The part of autocannon's interface that the bench uses; the package carries no types of its own. */
declare module 'autocannon' {
  interface Options {
    url: string;
    connections: number;
    duration: number;
    requests: { method: 'POST'; path: string; headers: Record<string, string>; body: string }[];
  }
  interface Result {
    requests: { average: number; total: number };
    latency: { p50: number; p99: number };
    errors: number;
    timeouts: number;
    non2xx: number;
    '2xx': number;
  }
  const autocannon: (options: Options) => Promise<Result>;
  export default autocannon;
}
