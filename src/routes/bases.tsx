export { BasesPage as default } from '#src/features/bases/components/BasesPage.tsx';
