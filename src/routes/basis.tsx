import { BasisPage } from '#src/features/bases/components/BasisPage.tsx';
import { StartDraft } from '#src/features/drafts/components/StartDraft.tsx';
import { may } from '#src/lib/api/session.ts';

export default function BasisRoute() {
  return <BasisPage actions={(basis) => may(basis, 'editions.draft') && <StartDraft basis={basis} />} />;
}
