import { KeyHolder } from './key-holder';
import type { NumberedRequest } from './signer-messages';

/** The only place where a private key is open. Serve this script with a policy that lets it reach no network. */
const holder = new KeyHolder();

self.addEventListener('message', async ({ data }: MessageEvent<NumberedRequest>) => {
  self.postMessage(await holder.answer(data));
});
