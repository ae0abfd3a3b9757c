export { BasisPage as default } from '#src/features/bases/components/BasisPage.tsx';
