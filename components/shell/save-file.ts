export { saveFile } from '@/components/ui/save-file';
