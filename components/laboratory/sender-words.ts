export interface Sender {
  channel: 'browser' | 'token' | 'whole-round';
  userName: string | null;
  tokenName: string | null;
}

/** Who sent a file: a person, the laboratory's own program, or the provider with the whole round. */
export function senderWords({ channel, userName, tokenName }: Sender): string {
  if (channel === 'whole-round') return 'the provider, with the whole round';
  if (channel === 'token') return tokenName ? `your program with the token ${tokenName}` : 'your program';
  return userName ?? 'someone who is no longer registered';
}
