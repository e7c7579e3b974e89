import { MessagePage } from "@/components/shell/message-page";
import { LinkButton } from "@/components/ui/link-button";

export default function SessionNotFound() {
  return (
    <MessagePage
      title="There is no such session"
      actions={
        <LinkButton href="/camps" variant="primary">
          To the camps
        </LinkButton>
      }
    >
      <p>The plan may have dropped it, or its camp is not one that you can see.</p>
    </MessagePage>
  );
}
