import { Page } from '@/components/ui/page';

export default function Route() {
  return <Page title="Boards">{null}</Page>;
}
