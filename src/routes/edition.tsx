export { EditionPage as default } from '#src/features/bases/components/EditionPage.tsx';
