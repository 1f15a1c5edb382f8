import { Page } from '@/components/ui/page';

export default function Route() {
  return <Page title="What did the board report?">{null}</Page>;
}
