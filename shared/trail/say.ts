import type { TrailEvent } from './events.ts';

const members = (count: number) => (count === 1 ? '1 member' : `${count} members`);

/** An event in words, to follow the person's name: "pinned edition …". Exhaustive over the union. */
export function say(event: TrailEvent): string {
  switch (event.kind) {
    case 'firm.set-up':
      return `set up the firm ${event.detail.name}`;
    case 'person.roles-changed': {
      const { name, roles } = event.detail;
      return roles.length > 0 ? `gave ${name} the roles ${roles.join(', ')}` : `took ${name} out of the firm`;
    }
    case 'session.opened':
      return 'signed in';
    case 'session.closed':
      return 'signed out';
    case 'project.opened':
      return `opened the project ${event.detail.title}`;
    case 'project.changed': {
      const { fields, rechecked } = event.detail;
      const after = rechecked > 0 ? `; ${members(rechecked)} checked again` : '';
      return `changed ${fields.join(', ')} of the project${after}`;
    }
    case 'project.edition-pinned':
      return `pinned ${event.detail.edition}; ${members(event.detail.rechecked)} checked against it`;
    case 'member.added':
      return `added member ${event.detail.mark}`;
    case 'member.saved':
      return `saved member ${event.detail.mark} as version ${event.detail.version}`;
    case 'member.removed':
      return `took member ${event.detail.mark} out of the project`;
    case 'basis.set-up':
      return `set up the basis ${event.detail.title} from the starter ${event.detail.starter}`;
    case 'edition.drafted':
      return `drafted ${event.detail.edition}: ${event.detail.reason}`;
    case 'edition.changed':
      return `changed ${event.detail.places} ${event.detail.places === 1 ? 'place' : 'places'} of the draft ${event.detail.edition}, version ${event.detail.version}`;
    case 'edition.submitted':
      return `submitted ${event.detail.edition} for check`;
    case 'edition.returned':
      return `returned ${event.detail.edition} to its author`;
    case 'edition.released':
      return `released ${event.detail.edition}`;
    case 'edition.superseded':
      return `superseded ${event.detail.edition}`;
    case 'edition.withdrawn':
      return `withdrew ${event.detail.edition}`;
    case 'stock.set-up':
      return `set up the stock list ${event.detail.title}`;
  }
}
