using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>What the trade calls things in English, German, French, Spanish, Italian, Portuguese, Dutch, Swedish and Finnish; accents do not matter.</summary>
internal static class TradeWords
{
    public static IReadOnlyDictionary<Channel, string[]> Channels { get; } = new Dictionary<Channel, string[]>
    {
        [Channel.HeartRate] =
        [
            "heart rate", "hr", "pulse", "bpm", "herzfrequenz", "herzrate", "puls", "hf", "fréquence cardiaque", "fc", "pouls", "frecuencia cardiaca", "pulso",
            "frequenza cardiaca", "frequência cardíaca", "hartslag", "hjärtfrekvens", "syke", "sydämen syke",
        ],
        [Channel.Power] = ["power", "watt", "watts", "leistung", "puissance", "potencia", "potenza", "potência", "vermogen", "effekt", "teho"],
        [Channel.Speed] =
        [
            "speed", "velocity", "geschwindigkeit", "tempo", "vitesse", "velocidad", "velocità", "velocidade", "snelheid", "hastighet", "fart", "nopeus",
        ],
        [Channel.Cadence] =
        [
            "cadence", "rpm", "kadenz", "trittfrequenz", "drehzahl", "cadencia", "cadenza", "cadência", "cadans", "kadens", "kadenssi", "poljinnopeus", "kierrosmäärä",
        ],
        [Channel.Distance] = ["distance", "distanz", "strecke", "distancia", "distanza", "distância", "afstand", "distans", "sträcka", "matka"],
        [Channel.Altitude] = ["altitude", "elevation", "höhe", "altitud", "elevación", "altitudine", "quota", "hoogte", "höjd", "korkeus"],
    };

    public static IReadOnlyList<string> Time { get; } =
    [
        "time", "timestamp", "date time", "utc", "epoch", "moment", "when", "zeit", "zeitpunkt", "zeitstempel", "uhrzeit", "temps", "heure", "horodatage", "tiempo", "hora", "tempo",
        "ora", "tijd", "tijdstip", "tid", "tidpunkt", "klockslag", "aika", "kellonaika",
    ];

    public static IReadOnlyList<string> Elapsed { get; } =
    [
        "seconds", "elapsed", "elapsed time", "sekunden", "laufzeit", "secondes", "segundos", "secondi", "seconden", "sekunder", "sekunnit", "kesto", "dauer", "durée",
    ];

    public static IReadOnlyList<string> Person { get; } =
    [
        "player", "athlete", "person", "name", "participant", "member", "device", "sensor", "pod", "serial", "spieler", "spielerin", "athlet", "sportler", "teilnehmer", "mitglied",
        "gerätenummer", "joueur", "athlète", "nom", "jugador", "jugadora", "atleta", "nombre", "giocatore", "nome", "jogador", "speler", "naam", "sporter", "spelare", "namn",
        "pelaaja", "urheilija", "nimi", "jäsen",
    ];

    public static IReadOnlyList<string> Sport { get; } = ["sport", "sportart", "discipline", "disziplin", "deporte", "esporte", "laji", "idrott"];

    public static IReadOnlyList<string> Reception { get; } =
        ["satellites", "satelliten", "satelites", "satelliti", "satellieten", "satelliter", "satelliitit", "accuracy", "genauigkeit", "precision", "hdop"];

    /// <summary>Words of a number about more than one moment.</summary>
    public static IReadOnlyList<string> Summaries { get; } =
    [
        "max", "maximum", "maximal", "min", "minimum", "avg", "average", "mean", "total", "sum", "zone", "limit", "target", "top", "peak", "mittel", "mittelwert", "durchschnitt",
        "gesamt", "summe", "moyenne", "moyen", "media", "medio", "totale", "gemiddelde", "medel", "keskiarvo", "vmax",
    ];

    /// <summary>By kind of table: its fields and what their columns are called.</summary>
    public static IReadOnlyDictionary<CsvKind, IReadOnlyList<(string Field, string[] Words)>> Fields { get; } =
        new Dictionary<CsvKind, IReadOnlyList<(string, string[])>>
        {
            [CsvKind.Sets] =
            [
                ("exercise", ["exercise", "übung", "exercice", "ejercicio", "esercizio", "exercício", "oefening", "övning", "liike", "harjoitus"]),
                ("repetitions", ["repetitions", "reps", "wiederholungen", "wdh", "répétitions", "repeticiones", "ripetizioni", "repetições", "herhalingen", "repetitioner", "toistot"]),
                ("kilograms", ["kg", "kilograms", "weight", "gewicht", "last", "poids", "charge", "peso", "carico", "vikt", "paino", "kuorma"]),
                ("set", ["set", "satz", "série", "serie", "sarja"]),
                ("machine", ["machine", "gerät", "maschine", "appareil", "máquina", "macchina", "apparaat", "maskin", "laite"]),
                ("repetitions_in_reserve", ["reserve", "reserven", "réserve", "reserva", "riserva"]),
                ("seconds", ["seconds", "seconds held", "hold time", "sekunden", "haltezeit", "secondes", "segundos", "secondi", "seconden", "sekunder", "sekunnit", "pitoaika"]),
                ("bar_speed", ["bar speed", "bar velocity", "hantelgeschwindigkeit", "vitesse de la barre", "velocidad de la barra", "velocità del bilanciere", "velocidade da barra", "tangon nopeus"]),
                ("hardness", ["hardness", "rpe", "effort", "härte", "anstrengung", "ressenti", "esfuerzo", "sforzo", "esforço", "inspanning", "ansträngning", "rasittavuus"]),
            ],
            [CsvKind.Tests] =
            [
                ("test", ["test", "prüfung", "épreuve", "prueba", "prova", "testi"]),
                ("value", ["value", "wert", "ergebnis", "result", "résultat", "valeur", "valor", "resultado", "valore", "risultato", "waarde", "värde", "resultat", "arvo", "tulos"]),
                ("unit", ["unit", "einheit", "unité", "unidad", "unità", "unidade", "eenheid", "enhet", "yksikkö"]),
                ("hand", ["hand", "main", "mano", "mão", "käsi"]),
            ],
            [CsvKind.Sessions] =
            [
                ("minutes", ["minutes", "duration", "dauer", "minuten", "durée", "duración", "durata", "duração", "duur", "varaktighet", "kesto", "minuutit"]),
                ("rating", ["rating", "rpe", "effort", "anstrengung", "ressenti", "esfuerzo", "sforzo", "esforço", "inspanning", "ansträngning", "rasittavuus"]),
                ("drill", ["drill", "übungsform", "exercice", "ejercicio"]),
                ("order", ["session number", "nr", "einheit nr"]),
                ("start", ["start", "beginn", "début", "inicio", "inizio", "aanvang", "alku"]),
            ],
            [CsvKind.Days] = [("day", ["day", "status", "attendance", "absence", "anwesenheit", "zustand", "présence", "asistencia", "presenza", "närvaro", "läsnäolo"])],
            [CsvKind.Plan] =
            [
                ("plan", ["plan", "planned", "geplant", "planung", "prévu", "planificado", "pianificato", "planejado", "gepland", "planerat", "suunnitelma"]),
                ("start", ["start", "beginn", "début", "inicio", "inizio", "aanvang", "alku"]),
                ("end", ["end", "ende", "fin", "fine", "fim", "einde", "slut", "loppu"]),
            ],
            [CsvKind.Answers] =
            [
                ("answer", ["answer", "antwort", "réponse", "respuesta", "risposta", "resposta", "antwoord", "svar", "vastaus"]),
                ("rule", ["rule", "regel", "règle", "regla", "regola", "regra", "sääntö"]),
                ("file", ["file", "datei", "fichier", "archivo", "arquivo", "bestand", "tiedosto"]),
                ("note", ["note", "comment", "remark", "notiz", "bemerkung", "kommentar", "remarque", "nota", "opmerking", "anteckning", "huomautus"]),
            ],
        };
}
