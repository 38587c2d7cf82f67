import { useRouter } from 'next/navigation';
import { useRef, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';

import { planCase } from '@/app/_live/api';
import { serverNowMs } from '@/app/_live/use-now';
import type { PlanCaseRequest } from '@/lib/contracts/http/commands';

/** Sends a plan and goes to its log. The same try keeps its id, so that a repeat after "no answer" plans one case only. */
export function usePlanCase() {
  const router = useRouter();
  const attempt = useRef<Pick<PlanCaseRequest, 'commandId' | 'eventAt'> | null>(null);
  const sentBytes = useRef('');
  const [problem, setProblem] = useState<string | null>(null);
  const [isSending, setIsSending] = useState(false);

  const send = async (planned: Pick<PlanCaseRequest, 'plan' | 'identity' | 'hospitalId' | 'team'>) => {
    const bytes = JSON.stringify(planned);
    if (attempt.current === null || bytes !== sentBytes.current) {
      attempt.current = { commandId: uuidv7(), eventAt: new Date(serverNowMs()).toISOString() };
      sentBytes.current = bytes;
    }
    setIsSending(true);
    setProblem(null);
    try {
      const reply = await planCase({ ...attempt.current, ...planned });
      if (reply.kind === 'committed') {
        router.push(`/cases/${reply.caseId}/log`);
        return;
      }
      setProblem(reply.message);
    } catch (cause) {
      setProblem(cause instanceof Error ? cause.message : 'Not planned: the server gave no answer that this page can read.');
    }
    setIsSending(false);
  };
  return { send, problem, isSending };
}
