/** Before tests that predict through the server: the kernel must be there, built from the sources as they are. */
import { provideBuild } from './build-output.mjs';

export default async function provideKernel() {
  await provideBuild('kernel');
}
