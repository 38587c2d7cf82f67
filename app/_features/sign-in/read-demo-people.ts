import { ask } from '@/app/_live/api';
import { demoPeopleReplySchema, type DemoPerson } from '@/lib/contracts/http/account';

/** The people of the demo with their present codes. */
export async function readDemoPeople(): Promise<readonly DemoPerson[]> {
  return (await ask('/api/demo-people', demoPeopleReplySchema)).people;
}
