/*
 * A complete program against librankstead: did the waiting times of ten patients change, by how much, how surely?
 *
 * It prints p, the estimate of the change (after - before, in minutes), its 95 % limits, and a sentence for a report.
 */
#include <rankstead.h>

#include <stdio.h>

/* Minutes from arrival to first contact, invented. Row by row the same patient. */
static const double before[] = {41, 35, 52, 38, 47, 44, 36, 50, 43, 39};
static const double after[] = {33.5, 34, 39, 42, 38, 38.5, 38, 39, 37, 36};
enum { patients = sizeof before / sizeof before[0] };

/* Tells why a call failed, and says whether it did. */
static int failed(const rks_inquiry* inquiry, const char* call, rks_status status) {
    if (status == RKS_OK)
        return 0;
    fprintf(stderr, "%s: %s: %s\n", call, rks_status_text(status), rks_inquiry_message(inquiry));
    return 1;
}

/* Prints one number answer in full. */
static int print_number(const rks_inquiry* inquiry, const char* answer) {
    double number = 0;
    if (failed(inquiry, answer, rks_inquiry_number(inquiry, answer, &number)))
        return 1;
    printf("%s = %.17g\n", answer, number);
    return 0;
}

static int print_sentence(const rks_inquiry* inquiry) {
    const char* text = NULL;
    if (failed(inquiry, "sentence", rks_inquiry_text(inquiry, "sentence", &text, NULL)))
        return 1;
    printf("%s\n", text);
    return 0;
}

/* The data are borrowed until run returns; here they live as long as the program. */
static int ask(rks_inquiry* inquiry) {
    return failed(inquiry, "before", rks_inquiry_numbers(inquiry, "before", before, patients, 1)) ||
           failed(inquiry, "after", rks_inquiry_numbers(inquiry, "after", after, patients, 1)) ||
           failed(inquiry, "unit", rks_inquiry_set(inquiry, "unit", "minutes")) ||
           failed(inquiry, "run", rks_inquiry_run(inquiry));
}

int main(void) {
    rks_inquiry* inquiry = NULL;
    int failure = failed(inquiry, "new", rks_inquiry_new("pairs", &inquiry)) || ask(inquiry) ||
                  print_number(inquiry, "p") || print_number(inquiry, "estimate") || print_number(inquiry, "lower") ||
                  print_number(inquiry, "upper") || print_sentence(inquiry);
    rks_inquiry_free(inquiry);
    return failure;
}
