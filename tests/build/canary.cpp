// Clean as it stands; with ISOHYDRIC_CANARY it holds what the warnings of the project exist to find: a narrowing.
int whole_part(double value);

int whole_part(double value) {
#ifdef ISOHYDRIC_CANARY
    return value;
#else
    return static_cast<int>(value);
#endif
}
