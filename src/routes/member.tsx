export { MemberPage as default } from '#src/features/members/components/MemberPage.tsx';
