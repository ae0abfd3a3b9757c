export { FirmPage as default } from '#src/features/firm/components/FirmPage.tsx';
