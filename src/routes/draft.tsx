export { DraftPage as default } from '#src/features/drafts/components/DraftPage.tsx';
