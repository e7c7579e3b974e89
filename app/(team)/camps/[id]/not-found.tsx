import { MessagePage } from "@/components/shell/message-page";
import { LinkButton } from "@/components/ui/link-button";

export default function CampNotFound() {
  return (
    <MessagePage
      title="There is no such camp"
      actions={
        <LinkButton href="/camps" variant="primary">
          To the camps
        </LinkButton>
      }
    >
      <p>It may have been removed, or it is not one that you can see.</p>
    </MessagePage>
  );
}
