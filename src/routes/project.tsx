export { ProjectPage as default } from '#src/features/projects/components/ProjectPage.tsx';
