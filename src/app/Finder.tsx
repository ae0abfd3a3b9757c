import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useState, type KeyboardEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { listBases } from '#shared/contracts/bases.ts';
import { listProjectMembers, listProjects } from '#shared/contracts/projects.ts';
import { Dialog } from '#src/components/Dialog.tsx';
import { call } from '#src/lib/api/call.ts';

interface Found {
  label: string;
  note: string;
  to: string;
}

const pages: readonly Found[] = [
  { label: 'Desk', note: 'Page', to: '/' },
  { label: 'Projects', note: 'Page', to: '/projects' },
  { label: 'Bases', note: 'Page', to: '/bases' },
  { label: 'Stock', note: 'Page', to: '/stock' },
  { label: 'Trail', note: 'Page', to: '/trail' },
  { label: 'Firm', note: 'Page', to: '/firm' },
];

/** Everything that can be gone to: pages, projects and their members, bases and their editions. */
async function gather(): Promise<Found[]> {
  const [projects, bases] = await Promise.all([
    call(listProjects, { query: { size: 100 } }),
    call(listBases),
  ]);
  const members = await Promise.all(
    projects.items.slice(0, 30).map(async (project) => {
      const { items } = await call(listProjectMembers, { params: { id: project.id } });
      return items.map((member) => ({
        label: `${member.mark} ${member.title}`.trim(),
        note: project.title,
        to: `/projects/${project.id}/members/${member.id}`,
      }));
    }),
  );
  return [
    ...projects.items.map(({ id, title }) => ({ label: title, note: 'Project', to: `/projects/${id}` })),
    ...members.flat(),
    ...bases.items.map(({ id, title }) => ({ label: title, note: 'Basis', to: `/bases/${id}` })),
    ...bases.items.flatMap(({ title, editions }) =>
      editions.map(({ id, number }) => ({
        label: `${title}, edition ${number}`,
        note: 'Edition',
        to: `/editions/${id}`,
      })),
    ),
  ];
}

/** Command finder: type, choose with the arrows, go with Enter. */
export default function Finder({ onClose }: { onClose: () => void }) {
  const [text, setText] = useState('');
  const [at, setAt] = useState(0);
  const navigate = useNavigate();
  const { data = [] } = useQuery({ queryKey: ['finder'], queryFn: gather });
  const wanted = useDeferredValue(text).toLowerCase().split(/\s+/).filter(Boolean);
  const found = [...pages, ...data]
    .filter(({ label, note }) => wanted.every((word) => `${label} ${note}`.toLowerCase().includes(word)))
    .slice(0, 12);
  const go = (to: string) => {
    onClose();
    void navigate(to);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step !== undefined) {
      event.preventDefault();
      setAt((index) => (index + step + found.length) % Math.max(found.length, 1));
    } else if (event.key === 'Enter') {
      const chosen = found[at];
      if (chosen) go(chosen.to);
    }
  };
  return (
    <Dialog title="Find" open onClose={onClose}>
      <input
        autoFocus
        role="combobox"
        aria-expanded
        aria-controls="found"
        aria-activedescendant={found[at] ? `found-${at}` : undefined}
        aria-label="Find a project, member, basis or page"
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          setAt(0);
        }}
        onKeyDown={onKeyDown}
        className="mb-2 w-full rounded border border-pencil bg-raised px-3 py-2 text-lg"
        placeholder="Project, member, basis, page"
      />
      <ul id="found" role="listbox" aria-label="Found" className="min-h-60">
        {found.map((item, index) => (
          <li
            key={item.to}
            id={`found-${index}`}
            role="option"
            aria-selected={index === at}
            onClick={() => go(item.to)}
            onMouseEnter={() => setAt(index)}
            className={`flex cursor-pointer items-baseline gap-3 border-b border-rule px-2 py-1.5 ${index === at ? 'bg-wash' : ''}`}
          >
            <span className="truncate">{item.label}</span>
            <span className="ml-auto text-xs text-soft">{item.note}</span>
          </li>
        ))}
      </ul>
      {found.length === 0 && <p className="px-2 text-soft">Nothing is called that.</p>}
    </Dialog>
  );
}
