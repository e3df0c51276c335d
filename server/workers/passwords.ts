import { parentPort } from 'node:worker_threads';
import bcrypt from 'bcryptjs';

import type { PasswordReply, PasswordTask } from '@/server/auth/passwords';

/** Hashes and compares off the event loop; the text comes prepared (`prepared` in server/auth/passwords). */
const answer = (task: PasswordTask): Promise<string | boolean> =>
  task.act === 'hash' ? bcrypt.hash(task.text, task.cost) : bcrypt.compare(task.text, task.stored);

parentPort?.on('message', (task: PasswordTask & { id: number }) => {
  const reply = (message: PasswordReply) => parentPort?.postMessage(message);
  answer(task).then(
    (result) => reply({ id: task.id, result }),
    () => reply({ id: task.id, error: 'The password could not be checked.' }),
  );
});
