export { PageLoading as default } from '@/components/access/page-loading';
