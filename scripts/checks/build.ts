import { ensureClientBuild } from '../setup/client-build';
import { Refusal } from '../setup/refusal.mjs';

try {
  const { folder, isNew } = await ensureClientBuild();
  console.log(isNew ? `built ${folder}` : `${folder} holds the build of these sources`);
} catch (error) {
  console.error(error instanceof Refusal ? error.message : error);
  process.exitCode = 1;
}
