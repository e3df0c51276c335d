import { AdminScreen } from '@/components/admin/AdminScreen';

export default function Route() {
  return <AdminScreen />;
}
