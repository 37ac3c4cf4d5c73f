import { compare, hash } from 'bcryptjs';

export type PasswordTask =
  | { readonly kind: 'hash'; readonly material: string; readonly cost: number }
  | { readonly kind: 'compare'; readonly material: string; readonly hash: string };

/** Runs in a thread of its own: bcrypt takes long on purpose and must not hold up other requests. */
export default async function runPasswordTask(task: PasswordTask): Promise<string | boolean> {
  return task.kind === 'hash' ? hash(task.material, task.cost) : compare(task.material, task.hash);
}
