'use client';

import { ConsoleDialog } from '@/app/_features/log/console-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { Kbd } from '@/app/_ui/kbd';
import { consoleKeys } from '@/lib/case/console-keys';

/** Every key with what it does. */
export function KeysDialog({ onClose }: { readonly onClose: () => void }) {
  const { state } = useLogCase();
  const sites = state.plan.nerves.flatMap((nerve) => nerve.sites);
  const groups = [
    {
      title: 'Run',
      rows: [
        ['Enter', 'Log run'],
        ['Tab', 'Next field'],
        ...Object.entries(consoleKeys).filter(([key]) => 'nrsu'.includes(key)),
      ],
    },
    { title: 'Site, while the site group has the focus', rows: sites.flatMap((site) => (site.hotkey === null ? [] : [[site.hotkey, site.name]])) },
    { title: 'Alert', rows: Object.entries(consoleKeys).filter(([key]) => 'tbae'.includes(key)) },
    { title: 'Step', rows: [...state.plan.steps.flatMap((step) => (step.hotkey === null ? [] : [[step.hotkey, step.label]])), ['o', consoleKeys.o]] },
    { title: 'Other', rows: [['c', consoleKeys.c], ['m', consoleKeys.m], ['v', consoleKeys.v], ['?', 'Keys'], ['Esc', 'Leave a question']] },
  ];
  return (
    <ConsoleDialog isOpen isWide onOpenChange={onClose} title="Keys" description="Letters act when no number is half typed and no text is being written.">
      <div className="columns-2 gap-10">
        {groups.map((group) => (
          <section key={group.title} className="mb-5 break-inside-avoid">
            <h3 className="mb-1 font-semibold">{group.title}</h3>
            <dl>
              {group.rows.map(([key = '', words]) => (
                <div key={`${key} ${words}`} className="flex items-center justify-between gap-4 border-b border-rule py-1">
                  <dd>{words}</dd>
                  <dt className="order-last"><Kbd>{key.length === 1 ? key.toUpperCase() : key}</Kbd></dt>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
    </ConsoleDialog>
  );
}
