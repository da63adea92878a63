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

/* Says what was refused and why, each fault on its line. */
static int refused(const char *what, dwv_error *error)
{
    fprintf(stderr, "%s: %s\n", what, dwv_error_message(error).data);
    dwv_error_free(error);
    return EXIT_FAILURE;
}

/* The bytes of a file, which the caller frees; NULL when it cannot be read. */
static char *read_file(const char *path, size_t *length)
{
    FILE *file = fopen(path, "rb");
    char *bytes = NULL;
    long end = -1;
    if (file != NULL && fseek(file, 0, SEEK_END) == 0 && (end = ftell(file)) >= 0 && fseek(file, 0, SEEK_SET) == 0)
        bytes = malloc((size_t)end + 1);
    if (bytes != NULL)
        *length = fread(bytes, 1, (size_t)end, file);
    if (file != NULL)
        fclose(file);
    return bytes;
}

/* One line a pipe. Its texts point into the sizing: nothing is to be freed. */
static void print_pipes(const dwv_sizing *sizing)
{
    for (size_t index = 0; index < dwv_sizing_pipe_count(sizing); index++) {
        dwv_pipe_row pipe;
        if (dwv_sizing_pipe(sizing, index, &pipe) != DWV_OK)
            return;
        printf("%-6s %-16s %7.3f FU  %5s in  %-8s  %s (%s)\n", pipe.id.data, pipe.name.data,
               (double)pipe.load_thousandths / 1000.0, pipe.size.hundredths != 0 ? pipe.size.text.data : "?",
               pipe.vertical ? "vertical" : pipe.slope.data, pipe.governed_by.data, pipe.clause.data);
    }
}

/* What breaks the code, and what cannot be decided. */
static void print_findings(const dwv_sizing *sizing)
{
    for (size_t index = 0; index < dwv_sizing_finding_count(sizing); index++) {
        dwv_finding_row finding;
        if (dwv_sizing_finding(sizing, index, &finding) != DWV_OK)
            return;
        printf("%s: %s (%s)\n", finding.severity.data, finding.message.data, finding.clause.data);
    }
}

/* Why a pipe, fixture or terminal is what it is. */
static int print_why(const dwv_sizing *sizing, const char *id)
{
    dwv_string *why = NULL;
    dwv_error *error = NULL;
    if (dwv_sizing_why(sizing, id, strlen(id), &why, &error) != DWV_OK)
        return refused(id, error);
    printf("\n%s", dwv_string_text(why).data);
    dwv_string_free(why);
    return EXIT_SUCCESS;
}

/* A single value of a table, as a spreadsheet cell would ask for it. */
static int print_least_vent(void)
{
    dwv_edition *edition = NULL;
    dwv_error *error = NULL;
    uint32_t vent_hundredths = 0;
    if (dwv_edition_open("npc-2015", strlen("npc-2015"), &edition, &error) != DWV_OK)
        return refused("npc-2015", error);
    dwv_status status = dwv_vent_for_trap(edition, 200, &vent_hundredths, &error);
    dwv_edition_free(edition);
    if (status != DWV_OK)
        return refused("vent for a 2 in trap", error);
    printf("\nleast vent of a 2 in trap: %.2f in\n", vent_hundredths / 100.0);
    return EXIT_SUCCESS;
}

int main(int count, char **arguments)
{
    if (count < 2) {
        fprintf(stderr, "usage: %s layout.json [pipe]\n", arguments[0]);
        return EXIT_FAILURE;
    }
    if (dwv_abi_version() != DWV_ABI_VERSION) {
        fprintf(stderr, "the library is %s, this program was built for %s\n", dwv_version().data, DWV_VERSION);
        return EXIT_FAILURE;
    }
    size_t length = 0;
    char *json = read_file(arguments[1], &length);
    if (json == NULL) {
        perror(arguments[1]);
        return EXIT_FAILURE;
    }

    /* The file becomes a layout, the layout a sizing; neither needs what it was made of any more. */
    dwv_error *error = NULL;
    dwv_layout *layout = NULL;
    dwv_status status = dwv_layout_from_json(json, length, &layout, &error);
    free(json);
    if (status != DWV_OK)
        return refused(arguments[1], error);
    dwv_sizing *sizing = NULL;
    status = dwv_size(layout, NULL, &sizing, &error);
    dwv_layout_free(layout);
    if (status != DWV_OK)
        return refused(arguments[1], error);

    print_pipes(sizing);
    printf("\n%s\n", dwv_sizing_unattested(sizing).data);
    print_findings(sizing);
    int result = count > 2 ? print_why(sizing, arguments[2]) : EXIT_SUCCESS;
    dwv_sizing_free(sizing);

    if (result == EXIT_SUCCESS)
        result = print_least_vent();
    printf("\n%s\n", dwv_caution().data);
    return result;
}
