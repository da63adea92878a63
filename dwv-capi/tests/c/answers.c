/* Answers questions, one a line of standard input, with one line each: the answer, or ! and the message. */
#include <stdio.h>
#include <string.h>

#include "dwv.h"

int main(void)
{
    dwv_edition *edition = NULL;
    if (dwv_edition_open("npc-2015", 8, &edition, NULL) != DWV_OK)
        return 1;
    char line[4096];
    while (fgets(line, sizeof line, stdin) != NULL) {
        size_t length = strcspn(line, "\n");
        dwv_answer *answer = NULL;
        dwv_error *error = NULL;
        if (dwv_edition_answer(edition, line, length, &answer, &error) == DWV_OK)
            printf("%s\n", dwv_answer_text(answer).data);
        else
            printf("!%s\n", dwv_error_message(error).data);
        dwv_answer_free(answer);
        dwv_error_free(error);
    }
    dwv_edition_free(edition);
    return 0;
}
