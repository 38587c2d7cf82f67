import type { DemoSignIn } from './print-welcome';

export async function listDemoPeople(): Promise<readonly DemoSignIn[]> {
  return [];
}
