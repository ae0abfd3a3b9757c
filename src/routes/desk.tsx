export { DeskPage as default } from '#src/features/desk/components/DeskPage.tsx';
