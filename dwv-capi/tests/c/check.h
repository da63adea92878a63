/* A check that goes on after it fails, so that one run shows all failures. */
#ifndef CHECK_H
#define CHECK_H

#include <stdio.h>

static int failures = 0;

#define CHECK(holds)                                                              \
    do {                                                                          \
        if (!(holds)) {                                                           \
            printf("%s, line %d: %s does not hold\n", __FILE__, __LINE__, #holds); \
            failures++;                                                           \
        }                                                                         \
    } while (0)

/* A text of the program as the two arguments that the library asks for. */
#define TEXT(literal) literal, sizeof(literal) - 1

/* One kitchen sink with its vent. */
static const char SINK[] =
    "{\"format\": \"dwv-layout/1\", \"name\": \"sink\", \"edition\": \"npc-2015\", \"frost_can_close_vents\": true,"
    " \"levels\": [{\"id\": \"main\", \"floor\": \"0 m\"}],"
    " \"fixtures\": [{\"id\": \"KS\", \"kind\": \"kitchen-sink\", \"level\": \"main\", \"height\": \"0.45 m\"}],"
    " \"joints\": [{\"id\": \"J\", \"level\": \"main\", \"height\": \"0.4 m\"},"
    "              {\"id\": \"S\", \"level\": \"main\", \"height\": \"-1 m\"}],"
    " \"drains\": [{\"id\": \"d1\", \"from\": \"KS\", \"to\": \"J\", \"runs\": \"level\", \"length\": \"0.9 m\"},"
    "              {\"id\": \"d2\", \"from\": \"J\", \"to\": \"S\", \"runs\": \"vertical\"}],"
    " \"vents\": [{\"id\": \"v\", \"from\": \"J\", \"to\": \"T\", \"length\": \"3 m\"}],"
    " \"terminals\": [{\"id\": \"T\", \"through\": \"roof\", \"above\": \"300 mm\"}],"
    " \"sewer\": {\"at\": \"S\", \"invert\": \"-1 m\"}}";

#endif
