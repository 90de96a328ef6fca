namespace LoadWatch.Decoding.Internal; internal static class Placeholder { }
