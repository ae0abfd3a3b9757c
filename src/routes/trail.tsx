export { TrailPage as default } from '#src/features/trail/components/TrailPage.tsx';
