/* Sizes a layout file: prints its pipes row by row, asks why one has its size, and looks up a vent.
 *
 *   cargo build --release -p dwv-capi
 *   cc -Iinclude dwv-capi/examples/size_house.c target/release/libdwv.a -lpthread -ldl -lm -o size_house
 *   ./size_house python-examples/house.layout.json bd3
 */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "dwv.h"

static int fail(const char *what, dwv_error *error)
{
    fprintf(stderr, "%s: %s\n", what, dwv_error_message(error).data);
    dwv_error_free(error);
    return EXIT_FAILURE;
}

/* The bytes of a file; NULL when it cannot be read. */
static char *read_file(const char *path, size_t *length)
{
    FILE *file = fopen(path, "rb");
    char *bytes = NULL;
    long end = -1;
    if (file != NULL && fseek(file, 0, SEEK_END) == 0 && (end = ftell(file)) >= 0 && fseek(file, 0, SEEK_SET) == 0)
        bytes = malloc((size_t)end + 1);
    if (bytes != NULL) {
        *length = fread(bytes, 1, (size_t)end, file);
        bytes[*length] = '\0';
    }
    if (file != NULL)
        fclose(file);
    return bytes;
}

static void print_pipes(const dwv_sizing *sizing)
{
    for (size_t index = 0; index < dwv_sizing_pipe_count(sizing); index++) {
        dwv_pipe_row pipe;
        if (dwv_sizing_pipe(sizing, index, &pipe) != DWV_OK)
            return;
        printf("%-6s %-16s %7.3f FU  %5s in  %-8s  %s (%s)\n", pipe.id.data, pipe.name.data,
               (double)pipe.load_thousandths / 1000.0, pipe.size.hundredths ? pipe.size.text.data : "?",
               pipe.vertical ? "vertical" : pipe.slope.data, pipe.governed_by.data, pipe.clause.data);
    }
}

int main(int count, char **arguments)
{
    if (count < 2) {
        fprintf(stderr, "usage: %s layout.json [pipe]\n", arguments[0]);
        return EXIT_FAILURE;
    }
    size_t length = 0;
    char *json = read_file(arguments[1], &length);
    if (json == NULL) {
        perror(arguments[1]);
        return EXIT_FAILURE;
    }

    dwv_error *error = NULL;
    dwv_layout *layout = NULL;
    dwv_status status = dwv_layout_from_json(json, length, &layout, &error);
    free(json);
    if (status != DWV_OK)
        return fail(arguments[1], error);

    dwv_sizing *sizing = NULL;
    status = dwv_size(layout, NULL, &sizing, &error);
    dwv_layout_free(layout);
    if (status != DWV_OK)
        return fail(arguments[1], error);

    print_pipes(sizing);
    printf("\n%s\n", dwv_sizing_unattested(sizing).data);

    int result = EXIT_SUCCESS;
    if (count > 2) {
        dwv_string *why = NULL;
        if (dwv_sizing_why(sizing, arguments[2], strlen(arguments[2]), &why, &error) == DWV_OK)
            printf("\n%s", dwv_string_text(why).data);
        else
            result = fail(arguments[2], error);
        dwv_string_free(why);
    }
    dwv_sizing_free(sizing);

    dwv_edition *edition = NULL;
    uint32_t vent = 0;
    if (dwv_edition_open("npc-2015", strlen("npc-2015"), &edition, NULL) == DWV_OK &&
        dwv_vent_for_trap(edition, 200, &vent, NULL) == DWV_OK)
        printf("\nleast vent of a 2 in trap: %.2f in\n%s\n", vent / 100.0, dwv_caution().data);
    dwv_edition_free(edition);
    return result;
}
