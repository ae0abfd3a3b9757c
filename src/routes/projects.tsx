export { ProjectsPage as default } from '#src/features/projects/components/ProjectsPage.tsx';
