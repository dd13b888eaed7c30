/**
 * The network address a request came from. A forwarded address is believed only from as many proxies as are ours:
 * whatever stands further left was written by the caller.
 *
 * Example: with one proxy of ours, 'a, b' is b.
 */
export function callerAddress(socketAddress: string | undefined, forwardedFor: string | undefined, proxyHops: number): string {
  const chain = [...(forwardedFor ?? '').split(',').map(part => part.trim()).filter(Boolean), socketAddress ?? 'unknown']
  return chain[Math.max(0, chain.length - 1 - proxyHops)] ?? 'unknown'
}
